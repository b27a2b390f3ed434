import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import type { ProductSummary } from '#shared/contracts/products.contract.ts';
import { paths } from '#src/app/paths.ts';
import { Standing } from './standing.tsx';
import './products.css';

/** Products as bottles on a shelf. `front` draws a product's front label; without it the plain slip stands there. */
export function Shelf({ products, front }: { products: readonly ProductSummary[]; front?: (product: ProductSummary) => ReactNode }) {
  return (
    <ol className="shelf">
      {products.map((product) => (
        <li key={product.id}>
          <Link to={paths.product(product.id)}>
            {front ? front(product) : <PlainFront product={product} />}
            <span className="cap">
              <b>{product.name}</b>
              {product.netContent ? <span>{product.netContent}</span> : null}
              <Standing product={product} />
            </span>
          </Link>
        </li>
      ))}
    </ol>
  );
}

/** A white front with the product's own words, where no label is drawn yet. */
function PlainFront({ product }: { product: ProductSummary }) {
  const [first = '', ...rest] = product.name.split(' ');
  return (
    <span className="front slip" aria-hidden="true">
      <span className="front-brand">{product.brand}</span>
      <span className="front-name">{first}{rest.length > 0 ? <br /> : null}{rest.join(' ')}</span>
      <span className="front-foot"><span>{product.category.replaceAll('-', ' ')}</span><span>{product.netContent}</span></span>
    </span>
  );
}
