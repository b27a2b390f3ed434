/** The sixteen colours of HTML 4 with grey's other spelling, which drawing programs write by name (CSS Color, 6.1). */
const NAMED: Readonly<Record<string, string>> = {
  black: '#000000', silver: '#c0c0c0', gray: '#808080', grey: '#808080', white: '#ffffff', maroon: '#800000', red: '#ff0000', purple: '#800080', fuchsia: '#ff00ff',
  green: '#008000', lime: '#00ff00', olive: '#808000', yellow: '#ffff00', navy: '#000080', blue: '#0000ff', teal: '#008080', aqua: '#00ffff', orange: '#ffa500',
};

/** `#rrggbb` of a colour as drawings write it; `none` for none; `null` for what is no plain colour. */
export function readColour(text: string): string | null {
  const colour = text.trim().toLowerCase();
  if (colour === 'none' || colour === 'transparent') return 'none';
  if (colour === 'currentcolor') return '#000000';
  if (/^#[0-9a-f]{6}$/.test(colour)) return colour;
  if (/^#[0-9a-f]{3}$/.test(colour)) return `#${Array.from(colour.slice(1), (digit) => digit + digit).join('')}`;
  const rgb = /^rgb\(\s*(\d{1,3}%?)\s*[, ]\s*(\d{1,3}%?)\s*[, ]\s*(\d{1,3}%?)\s*\)$/.exec(colour);
  if (rgb) {
    const parts = rgb.slice(1).map((part) => (part.endsWith('%') ? Math.round(Number(part.slice(0, -1)) * 2.55) : Number(part)));
    return parts.some((part) => part > 255) ? null : `#${parts.map((part) => part.toString(16).padStart(2, '0')).join('')}`;
  }
  return NAMED[colour] ?? null;
}
