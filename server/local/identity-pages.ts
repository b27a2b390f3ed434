import { escapeHtml, renderPage } from '#server/auth/page.ts';

/** Someone the built-in identity service knows. */
export interface KnownPerson {
  readonly id: string;
  readonly name: string;
  readonly email: string;
  readonly work: string;
  readonly password: string;
}

const NOTE = '<p class="quiet act">This page belongs to the identity service that comes with a local start. In a real house your own identity service stands here.</p>';

/** The list of people: one click or Tab and Enter signs in. */
export function choosePage(uid: string, people: readonly KnownPerson[]): string {
  const rows = people
    .map((person) => `<li><form method="post" action="/sign-in/${escapeHtml(uid)}"><input type="hidden" name="person" value="${escapeHtml(person.id)}"><button type="submit"><span>${escapeHtml(person.name)}</span><span class="role">${escapeHtml(person.work)}</span></button></form></li>`)
    .join('');
  return renderPage('Who is signing in?', `<p>These people are invented. Choose one to see what their work looks like.</p><h2>People of this demonstration</h2><ul class="people">${rows}</ul>${NOTE}`);
}

/** For a new proof: address and password. @param fault shown when the last try failed */
export function passwordPage(uid: string, email: string, fault?: string): string {
  const told = fault === undefined ? '' : `<p class="fault" role="alert">${escapeHtml(fault)}</p>`;
  return renderPage(
    'Show that it is you',
    `<p>Give your password once more.</p>${told}<form method="post" action="/sign-in/${escapeHtml(uid)}"><label for="email">E-mail</label><input id="email" name="email" type="email" autocomplete="username" required value="${escapeHtml(email)}"><label for="password">Password</label><input id="password" name="password" type="password" autocomplete="current-password" required><button type="submit">Go on</button></form>${NOTE}`,
  );
}

export function lostPage(): string {
  return renderPage('This sign-in has ended', '<p>It took too long or was finished already. Go back to Colophon and sign in again.</p>');
}

/** Sent by itself; the button is for browsers that run no scripts. @param form the service's own form */
export function signOutPage(form: string): string {
  const withAnswer = form.replace('</form>', '<input type="hidden" name="logout" value="yes"><button type="submit">Sign out</button></form>');
  return renderPage('Signing out', `<p>The identity service forgets you too.</p>${withAnswer}<script>${SUBMIT}</script>`);
}
export const SUBMIT = 'document.forms[0].submit()';
