/**
 * A text from a project, a file or a person as one harmless line. Titles and names come from anywhere: a line end in one
 * could pass for a line of the command itself, an escape sequence could drive the terminal, and a mark that turns the
 * direction of writing could show a number back to front.
 */
export function oneLine(text: string): string {
  return text.replace(/[\p{Cc}\u2028-\u202e\u2066-\u2069]/gu, (character) => {
    const code = character.charCodeAt(0);
    // The block of control pictures shows each of the first 32 by its name.
    return code < 0x20 ? String.fromCharCode(0x2400 + code) : '\ufffd';
  });
}
