/** What may stand between two letters of one name: the end of a line, a soft hyphen, another kind of dash. */
const BETWEEN = '(?:[\\s\\u00AD\\u200B]|-\\s*\\n)*';

/** The text with the first place where `written` stands put right; the text itself where it stands nowhere. */
export function replaceName(text: string, written: string, by: string): string {
  const letters = [...written.replace(/\s+/g, '')].map((letter) => letter.replace(/[\\^$.*+?()[\]{}|/-]/g, '\\$&').replace(/^\\-$/, '[-\\u2010\\u2011]'));
  const place = new RegExp(`(?<![\\p{L}\\p{N}])${letters.join(BETWEEN)}(?![\\p{L}\\p{N}])`, 'iu').exec(text);
  return place ? text.slice(0, place.index) + by + text.slice(place.index + place[0].length) : text;
}
