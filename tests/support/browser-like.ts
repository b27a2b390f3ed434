/** A browser without a screen: keeps cookies by host and follows what it is told to. */
export interface BrowserLike {
  /** Asks once; redirects are not followed. */
  get(address: string): Promise<Response>;
  post(address: string, form: Readonly<Record<string, string>>): Promise<Response>;
  /** Follows redirects until a page answers. @returns the page and its address */
  follow(address: string): Promise<{ readonly response: Response; readonly address: string }>;
  cookie(name: string): string | undefined;
  setCookie(name: string, value: string): void;
}

export function createBrowserLike(): BrowserLike {
  const jar = new Map<string, string>();
  const ask = async (address: string, init: RequestInit = {}): Promise<Response> => {
    const headers = new Headers(init.headers);
    if (jar.size > 0) headers.set('Cookie', [...jar].map(([name, value]) => `${name}=${value}`).join('; '));
    const response = await fetch(address, { ...init, headers, redirect: 'manual' });
    for (const line of response.headers.getSetCookie()) {
      const [pair = ''] = line.split(';', 1);
      const at = pair.indexOf('=');
      const isOver = /expires=Thu, 01 Jan 1970/i.test(line) || /max-age=0/i.test(line);
      if (isOver || pair.slice(at + 1) === '') jar.delete(pair.slice(0, at));
      else jar.set(pair.slice(0, at), pair.slice(at + 1));
    }
    return response;
  };
  const browser: BrowserLike = {
    get: (address) => ask(address),
    post: (address, form) => ask(address, { method: 'POST', body: new URLSearchParams(form), headers: { Origin: new URL(address).origin } }),
    async follow(address) {
      let here = address;
      for (let step = 0; step < 12; step += 1) {
        const response = await ask(here);
        const next = response.headers.get('Location');
        if (next === null) return { response, address: here };
        here = new URL(next, here).href;
      }
      throw new Error(`too many redirects, last to ${here}`);
    },
    cookie: (name) => jar.get(name),
    setCookie: (name, value) => void jar.set(name, value),
  };
  return browser;
}
