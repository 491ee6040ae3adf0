/** Puts figures in place of their names in braces: "the slope gives {recomputed}". Names without a figure stay and are listed. */
export function fillIn(text: string, figures: Readonly<Record<string, string>>): { text: string; unknown: string[] } {
  const unknown: string[] = [];
  const filled = text.replace(/\{([^{}]*)\}/g, (whole, name: string) => {
    if (Object.hasOwn(figures, name)) return figures[name] ?? whole;
    unknown.push(name);
    return whole;
  });
  return { text: filled, unknown };
}
