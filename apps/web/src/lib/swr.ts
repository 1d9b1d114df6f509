import useSWR, { useSWRConfig, type SWRConfiguration, type SWRResponse } from 'swr';
import useSWRInfinite from 'swr/infinite';
import { request, type RequestInput } from './api-client';
import { asProblem, type ProblemError } from './problem';
import type { RouteId, RouteParams, RouteQuery, RouteResponse } from './routes';

type ReadInput<Id extends RouteId> = Pick<RequestInput<Id>, 'params' | 'query'>;
type Key<Id extends RouteId> = readonly [Id, ReadInput<Id>];

/**
 * The one configuration of every read. A 4xx is an answer and is not asked again; a failure of line or service is, three times.
 * `onSignedOut` sends to the sign-in page; the fetcher itself redirects nowhere.
 */
export function swrConfiguration(onSignedOut: () => void): SWRConfiguration {
  return {
    fetcher: ([id, input]: Key<RouteId>) => request(id, input as RequestInput<RouteId>),
    revalidateOnFocus: true,
    focusThrottleInterval: 15_000,
    dedupingInterval: 1_000,
    errorRetryCount: 3,
    shouldRetryOnError: (error: unknown) => {
      const { status } = asProblem(error);
      return status === 0 || status >= 500;
    },
    onError: (error: unknown) => {
      if (asProblem(error).code === 'not-signed-in') onSignedOut();
    },
  };
}

/** Reads a route; null as input means not yet. */
export function useRoute<Id extends RouteId>(
  id: Id,
  input: ReadInput<Id> | null,
  options: SWRConfiguration<RouteResponse<Id>, ProblemError> = {},
): SWRResponse<RouteResponse<Id>, ProblemError> {
  return useSWR<RouteResponse<Id>, ProblemError>(input === null ? null : [id, input], options);
}

export interface PagedRead<Item> {
  items: Item[];
  isLoading: boolean;
  isLoadingMore: boolean;
  hasMore: boolean;
  error: ProblemError | undefined;
  loadMore(): void;
  /** A filter on keys does not reach paged reads: a write that changes them calls this. */
  refresh(): Promise<unknown>;
}

type PageItem<Id extends RouteId> = RouteResponse<Id> extends { items: (infer Item)[] } ? Item : never;

/** Reads a cursor-paged route page by page. */
export function usePagedRoute<Id extends RouteId>(
  id: Id,
  params: RouteParams<Id>,
  query: Omit<NonNullable<RouteQuery<Id>>, 'cursor'> | undefined,
): PagedRead<PageItem<Id>> {
  type Page = { items: PageItem<Id>[]; nextCursor: string | null };
  const read = useSWRInfinite<Page, ProblemError>(
    (index: number, previous: Page | null) => {
      if (index > 0 && previous?.nextCursor == null) return null;
      return [
        id,
        { params, query: { ...query, ...(previous?.nextCursor != null && { cursor: previous.nextCursor }) } },
      ];
    },
    { revalidateFirstPage: false, keepPreviousData: true },
  );
  const pages = read.data ?? [];
  const isLoadingMore = read.isValidating && pages.length < read.size;
  return {
    items: pages.flatMap((page) => page.items),
    isLoading: read.isLoading && pages.length === 0,
    isLoadingMore,
    hasMore: pages.at(-1)?.nextCursor != null,
    error: read.error,
    loadMore: () => void read.setSize((size) => size + 1),
    refresh: () => read.mutate(),
  };
}

/** After a write: reads again every mounted answer of the named routes. */
export function useRevalidate(): (...ids: RouteId[]) => Promise<unknown> {
  const { mutate } = useSWRConfig();
  return (...ids) => mutate((key) => Array.isArray(key) && ids.includes(key[0] as RouteId));
}
