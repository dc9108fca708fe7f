import { configure, render } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { QueryClient } from '@tanstack/react-query';
import { createMemoryRouter } from 'react-router-dom';
import { Providers } from '#src/app/providers.tsx';
import { routes } from '#src/router.tsx';

// A screen is a file of its own, and reading the first of them takes a while.
configure({ asyncUtilTimeout: 10_000 });

// jsdom does not scroll.
Object.assign(window, { scrollTo: () => undefined });

/** Opens an address of the product, with its real router and a query client of its own. */
export function renderAt(address: string) {
  const client = new QueryClient({
    defaultOptions: {
      queries: { retry: false, networkMode: 'always' },
      mutations: { networkMode: 'always' },
    },
  });
  const router = createMemoryRouter(routes, { initialEntries: [address] });
  const user = userEvent.setup();
  const view = render(<Providers client={client} router={router} />);
  return { ...view, user, router, client };
}

/** What a field holds. */
export function valueOf(element: HTMLElement): string {
  const isField =
    element instanceof HTMLInputElement ||
    element instanceof HTMLTextAreaElement ||
    element instanceof HTMLSelectElement;
  if (isField) return element.value;
  throw new Error(`valueOf: needs a field, got ${element.tagName}`);
}
