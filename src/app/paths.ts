/** Every address of the browser app, once. */
export const paths = {
  today: '/',
  signIn: '/sign-in',
  /** The server's own: begins the sign-in through the house's identity service and returns to `next`. */
  signInStart: (next: string) => `/auth/sign-in?next=${encodeURIComponent(next)}`,
  /** A blank page that says one may go back, for signing in again beside unsaved work. */
  signedIn: '/signed-in',
  products: '/products',
  newProduct: '/products/new',
  product: (id: string) => `/products/${id}`,
  declaration: (id: string) => `/products/${id}/declaration`,
  verdicts: (id: string) => `/products/${id}/verdicts`,
  label: (id: string) => `/products/${id}/label`,
  report: (id: string) => `/products/${id}/report`,
  productTrail: (id: string) => `/products/${id}/trail`,
  /** Reading a pasted ingredient list. */
  read: '/read',
  /** Every dated rule, from one market if told. */
  calendar: '/calendar',
  materials: '/materials',
  newMaterial: '/materials/new',
  material: (id: string) => `/materials/${id}`,
  dictionary: '/dictionary',
  entry: (inci: string) => `/dictionary/${encodeURIComponent(inci)}`,
  house: '/house',
  /** What was done in the house, entry by entry. */
  trail: '/trail',
} as const;

/** Rooms as they stand in the bar. */
export const rooms: readonly { readonly word: string; readonly to: string; readonly end?: boolean }[] = [
  { word: 'Today', to: paths.today, end: true },
  { word: 'Products', to: paths.products },
  { word: 'Materials', to: paths.materials },
  { word: 'Dictionary', to: paths.dictionary },
  { word: 'Law calendar', to: paths.calendar },
  { word: 'House', to: paths.house },
];
