import type { ReactNode } from 'react';
import { ProductMark } from './ProductMark';

/** The frame of the few screens that one sees before signing in: one narrow column under the water line. */
export function PublicFrame({ children }: { children: ReactNode }) {
  return (
    <>
      <header className="water-edge">
        <div className="mx-auto flex max-w-xl items-center px-gutter py-3">
          <ProductMark />
        </div>
      </header>
      <div className="plumb-ticks" aria-hidden="true" />
      <main id="content" className="mx-auto grid max-w-xl gap-6 px-gutter pt-8 pb-24">
        {children}
      </main>
    </>
  );
}
