/** What the server takes of a paper; it looks at the content, not at the name. */
export const ACCEPTED = '.pdf,.jpg,.jpeg,.png,.webp,application/pdf,image/jpeg,image/png,image/webp';
export const MOST_BYTES = 20 * 1024 * 1024;
