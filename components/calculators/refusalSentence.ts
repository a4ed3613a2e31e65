/** "search: 4 ms x 40 is longer than ..." without the name of the function; places of faults ("byte 40: ...") stay. */
export function refusalSentence(message: string): string {
  const rule = message.replace(/^(search|stretchSpectrogram)\w*: /, "");
  const whole = `${rule[0].toUpperCase()}${rule.slice(1)}`;
  return whole.endsWith(".") ? whole : `${whole}.`;
}
