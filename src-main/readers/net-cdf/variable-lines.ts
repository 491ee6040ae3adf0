import type { Attributes, VariableFile } from './variable-file.ts';

const maxTextLength = 160;

/** What a NetCDF file says about itself, a line for each variable and attribute, for the preview. */
export function variableLines({ format, attributes, variables }: VariableFile): string[] {
  return [
    format,
    ...variables.flatMap((variable) => {
      const dimensions = variable.dimensions.map(({ name, size }) => `${name} = ${size}`).join(', ');
      return [`${variable.name}(${dimensions})`, ...attributeLines(variable.attributes, `  ${variable.name}:`)];
    }),
    ...attributeLines(attributes, ':'),
  ];
}

function attributeLines(attributes: Attributes, prefix: string): string[] {
  return Object.entries(attributes).map(([name, value]) => {
    const text = typeof value === 'string' ? value.replaceAll(/\s+/g, ' ') : value.slice(0, 8).join(', ');
    return `${prefix}${name} = ${text.slice(0, maxTextLength)}${text.length > maxTextLength ? ' …' : ''}`;
  });
}
