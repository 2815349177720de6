import type { QueryClient } from '@tanstack/react-query';
import { createContext } from 'react-router';

/** How a page's loader reaches the one cache: `context.get(queryClientContext)`. */
export const queryClientContext = createContext<QueryClient>();
