/** Index of the line end at or after `from`: "\n", "\r" or the end of the text. */
export function lineEnd(text: string, from: number): number {
  for (let i = from; i < text.length; i += 1) {
    const code = text.charCodeAt(i);
    if (code === 10 || code === 13) return i;
  }
  return text.length;
}

/** Start of the line after the line end at `end`; "\r\n" is one line end. */
export function nextLine(text: string, end: number): number {
  if (text.charCodeAt(end) === 13 && text.charCodeAt(end + 1) === 10) return end + 2;
  return end + 1;
}

const COMMENT = /^\s*(?:[!#%*']+|\/\/)\s?/;

export function isComment(line: string): boolean {
  return COMMENT.test(line);
}

export function withoutComment(line: string): string {
  return line.replace(COMMENT, "").trim();
}
