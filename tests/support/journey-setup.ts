/** Starts the product once for all journeys and stops it after the last. */
import { makeHome, removeHome, startProduct } from './product.ts';

export async function setup(): Promise<() => Promise<void>> {
  const home = makeHome();
  const product = await startProduct(home);
  process.env['COLOPHON_ADDRESS'] = product.address;
  process.env['COLOPHON_HOME'] = home;
  return async () => {
    await product.stop();
    removeHome(home);
  };
}
