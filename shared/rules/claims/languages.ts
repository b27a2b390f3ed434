/** Languages whose claims can be judged; each has a table `claims-<language>.json`. */
export const CLAIM_LANGUAGES = ['en', 'de', 'fr'] as const;
export type ClaimLanguage = (typeof CLAIM_LANGUAGES)[number];

/** The language that a claim is judged in (`en-GB` is English); nothing where there is no table for it. */
export function judgedIn(lang: string): ClaimLanguage | undefined {
  const language = lang.toLowerCase().split(/[-_]/)[0];
  return CLAIM_LANGUAGES.find((one) => one === language);
}
