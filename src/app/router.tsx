import type { QueryClient } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { createBrowserRouter, RouterContextProvider, useParams } from 'react-router';
import { paths } from '../lib/paths.ts';
import { queryClientContext } from '../lib/routerContext.ts';
import { AppFrame } from './AppFrame.tsx';
import { FirstLoad } from './FirstLoad.tsx';
import { openFirstProduction, requireSession, warmProduction } from './gates.ts';
import { NotFound } from './NotFound.tsx';
import { NoProduction } from './NoProduction.tsx';
import { RouteError } from './RouteError.tsx';

declare module 'react-router' {
  interface Future {
    v8_middleware: true;
  }
}

/** Pages inside a production have their `main` from the frame around them; these stand alone. */
const asMain = (page: ReactNode) => <main>{page}</main>;

function NothingHere() {
  return <NotFound home={paths.feed(useParams().slug!)} />;
}

/** Every address of the product. Pages load with their data, in parallel. */
export function createRouter(queryClient: QueryClient) {
  return createBrowserRouter(
    [
      {
        errorElement: asMain(<RouteError inside="everything" />),
        HydrateFallback: FirstLoad,
        children: [
          { path: '/', middleware: [openFirstProduction], loader: () => null, element: asMain(<NoProduction />) },
          {
            path: '/sign-in',
            lazy: { Component: async () => (await import('../pages/SignInPage.tsx')).SignInPage },
          },
          {
            path: '/p/:slug',
            middleware: [requireSession, warmProduction],
            loader: () => null,
            shouldRevalidate: () => false,
            Component: AppFrame,
            children: [
              {
                errorElement: <RouteError inside="production" />,
                children: [
                  {
                    index: true,
                    lazy: {
                      loader: async () => (await import('../pages/FeedPage.tsx')).loader,
                      Component: async () => (await import('../pages/FeedPage.tsx')).FeedPage,
                    },
                  },
                  {
                    path: 'shots',
                    lazy: {
                      loader: async () => (await import('../pages/SheetPage.tsx')).loader,
                      Component: async () => (await import('../pages/SheetPage.tsx')).SheetPage,
                    },
                  },
                  {
                    path: 'shots/:shotNumber/takes/:n',
                    lazy: {
                      loader: async () => (await import('../pages/TakePage.tsx')).loader,
                      Component: async () => (await import('../pages/TakePage.tsx')).TakePage,
                    },
                  },
                  {
                    path: 'people',
                    lazy: { Component: async () => (await import('../pages/PeoplePage.tsx')).PeoplePage },
                  },
                  {
                    path: 'post',
                    lazy: {
                      loader: async () => (await import('../pages/PostPage.tsx')).loader,
                      Component: async () => (await import('../pages/PostPage.tsx')).PostPage,
                    },
                  },
                  { path: '*', Component: NothingHere },
                ],
              },
            ],
          },
          { path: '*', element: asMain(<NotFound home="/" />) },
        ],
      },
    ],
    {
      future: { v8_middleware: true },
      getContext: () => {
        const context = new RouterContextProvider();
        context.set(queryClientContext, queryClient);
        return context;
      },
    },
  );
}
