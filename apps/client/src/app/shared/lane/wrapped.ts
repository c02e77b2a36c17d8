/** Words broken into at most two lines of a length in characters; what is left over ends in an ellipsis. */
export function wrapped(words: string, length: number): readonly string[] {
  if (words.length <= length) return [words];
  const space = words.lastIndexOf(' ', length);
  const at = space > 0 ? space : length;
  const rest = words.slice(at).trimStart();
  return [words.slice(0, at), rest.length > length ? `${rest.slice(0, length - 1).trimEnd()}…` : rest];
}
