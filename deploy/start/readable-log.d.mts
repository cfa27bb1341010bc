export function readable(line: string): { readonly text: string; readonly grave: boolean };
