import { useQuery } from '@tanstack/react-query';
import { Suspense, lazy } from 'react';
import { Link } from 'react-router-dom';
import type { ProductSummary } from '#shared/contracts/products.contract.ts';
import { paths } from '#src/app/paths.ts';
import { productQueries } from './queries.ts';
import { Standing } from './standing.tsx';
import './products.css';

// The painter and the printed type come after the page: the shelf stands without them.
const LabelThumbnail = lazy(async () => ({ default: (await import('#src/features/labels/label-art.tsx')).LabelThumbnail }));

/** Products on a shelf, each by the front of its own label. */
export function Shelf({ products }: { products: readonly ProductSummary[] }) {
  return (
    <ol className="shelf">
      {products.map((product) => (
        <li key={product.id}>
          <Link to={paths.product(product.id)}>
            <Front product={product} />
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

/** The label's front once it is drawn; until then, and where there is none, a plain slip with the product's words. */
function Front({ product }: { product: ProductSummary }) {
  const { data } = useQuery(productQueries.front(product.id, product.version));
  const slip = <PlainFront product={product} />;
  if (!data?.front) return slip;
  return <Suspense fallback={slip}><span className="front-art" aria-hidden="true"><LabelThumbnail front={data.front} width={148} height={188} name={product.name} /></span></Suspense>;
}

/** A white front with the product's own words, where no label can be drawn. */
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
