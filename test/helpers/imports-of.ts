import ts from 'typescript';
import type { Import } from './import-table.ts';

/** Every import of a source file, static and dynamic, and every re-export; of a Vue component, those of its script. */
export function importsOf(from: string, text: string): Import[] {
  const script = from.endsWith('.vue')
    ? [...text.matchAll(/<script\b[^>]*>([\s\S]*?)<\/script>/g)].map(([, code]) => code).join('\n')
    : text;
  const found: Import[] = [];
  const add = (specifier: ts.Node | undefined, isTypeOnly: boolean) => {
    if (specifier && ts.isStringLiteralLike(specifier)) found.push({ from, specifier: specifier.text, isTypeOnly });
  };
  const visit = (node: ts.Node): void => {
    if (ts.isImportDeclaration(node)) add(node.moduleSpecifier, isTypesOnly(node.importClause));
    else if (ts.isExportDeclaration(node)) add(node.moduleSpecifier, node.isTypeOnly);
    else if (ts.isImportTypeNode(node) && ts.isLiteralTypeNode(node.argument)) add(node.argument.literal, true);
    else if (ts.isCallExpression(node) && node.expression.kind === ts.SyntaxKind.ImportKeyword)
      add(node.arguments[0], false);
    ts.forEachChild(node, visit);
  };
  visit(ts.createSourceFile(from, script, ts.ScriptTarget.Latest, true, ts.ScriptKind.TS));
  return found;
}

/** `import type …`, or an import of which every single name is a type. */
function isTypesOnly(clause: ts.ImportClause | undefined): boolean {
  if (!clause) return false;
  if (clause.phaseModifier === ts.SyntaxKind.TypeKeyword) return true;
  const bindings = clause.namedBindings;
  if (clause.name || !bindings || !ts.isNamedImports(bindings)) return false;
  return bindings.elements.length > 0 && bindings.elements.every((element) => element.isTypeOnly);
}
