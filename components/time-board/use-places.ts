'use client';

import { useQuery, useQueryClient } from '@tanstack/react-query';
import { withPlaces } from '@/lib/opendays/rules/board';
import type { BoardView, PlacesLeft } from '@/lib/opendays/views';

const EVERY_MS = 15_000;

const isFigure = (value: unknown) => value === null || (typeof value === 'number' && Number.isInteger(value));

function isPlacesLeft(answer: unknown): answer is PlacesLeft {
  if (typeof answer !== 'object' || answer === null || !('places' in answer)) return false;
  const { places } = answer;
  return typeof places === 'object' && places !== null && Object.values(places).every(isFigure);
}

async function fetchPlaces(openDayId: string, signal: AbortSignal): Promise<PlacesLeft> {
  const response = await fetch(`/api/board/${openDayId}`, { signal, headers: { Accept: 'application/json' } });
  const answer: unknown = response.ok ? await response.json() : null;
  if (!isPlacesLeft(answer)) throw new Error(`places left were not answered (${response.status})`);
  return answer;
}

/** How many entry times have another figure than before. */
const changesOf = (before: PlacesLeft | undefined, now: PlacesLeft): number =>
  before === undefined ? 0 : Object.entries(now.places).filter(([id, places]) => before.places[id] !== places).length;

/** The board with places left as the server last said, asked again every 15 seconds while someone looks; and how many changed then. */
export function useFreshBoard(board: BoardView): { fresh: BoardView; changes: number } {
  const client = useQueryClient();
  const queryKey = ['places', board.openDayId];
  const { data } = useQuery({
    queryKey,
    queryFn: async ({ signal }) => {
      const now = await fetchPlaces(board.openDayId, signal);
      return { ...now, changes: changesOf(client.getQueryData<PlacesLeft>(queryKey), now) };
    },
    refetchInterval: EVERY_MS,
    staleTime: EVERY_MS,
  });
  return data ? { fresh: withPlaces(board, data), changes: data.changes } : { fresh: board, changes: 0 };
}
