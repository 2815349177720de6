import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { cleanup, render } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import type { ReactNode } from 'react';
import { MemoryRouter, useLocation } from 'react-router';
import { afterEach } from 'vitest';
import { productionOptions } from '../../src/lib/queries/production.ts';
import { sessionOptions } from '../../src/lib/queries/session.ts';
import { buildProduction, buildSession } from '../support/wire.ts';

afterEach(() => {
  cleanup();
  sessionStorage.clear();
  localStorage.clear();
});

export const SLUG = 'paper-yard';

/** A fresh cache that holds who is signed in and the production, and never asks a server. */
export function filledClient(): QueryClient {
  const client = new QueryClient({
    defaultOptions: { queries: { retry: false, staleTime: Number.POSITIVE_INFINITY }, mutations: { retry: false } },
  });
  client.setQueryData(sessionOptions().queryKey, buildSession());
  client.setQueryData(productionOptions(SLUG).queryKey, buildProduction());
  return client;
}

/** Renders something as a page would, and answers the cache and the hand of a user. */
export function show(ui: ReactNode, { client = filledClient(), at = `/p/${SLUG}` } = {}) {
  const user = userEvent.setup();
  const view = render(
    <QueryClientProvider client={client}>
      <MemoryRouter initialEntries={[at]}>
        {ui}
        <Address />
      </MemoryRouter>
    </QueryClientProvider>,
  );
  return { ...view, client, user, address: () => view.getByTestId('address').textContent };
}

function Address() {
  const { pathname, search } = useLocation();
  return <span data-testid="address">{pathname + search}</span>;
}

// jsdom knows no modal dialogs: here one is open or not, which is all these tests look at.
HTMLDialogElement.prototype.showModal ??= function showModal() {
  this.open = true;
};
HTMLDialogElement.prototype.close ??= function close() {
  this.open = false;
};

/** jsdom lays nothing out: answers width queries as a screen this wide would. */
export function screenOf(width: number): void {
  window.matchMedia = (query: string) => {
    const [, side, rem] = /\((max|min)-width: ([\d.]+)rem\)/.exec(query) ?? [];
    const edge = Number(rem) * 16;
    const matches = side === 'max' ? width <= edge : side === 'min' ? width >= edge : false;
    return {
      matches,
      media: query,
      addEventListener: () => {},
      removeEventListener: () => {},
    } as unknown as MediaQueryList;
  };
}
