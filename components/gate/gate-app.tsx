'use client';

import { QueryClient, QueryClientProvider, useQuery } from '@tanstack/react-query';
import { useState, useSyncExternalStore } from 'react';
import { keyForExchange, openedKey, rememberOpened, type Keep } from './device';
import { gateApi, GateRefused } from './gate-api';
import { GateClosed } from './gate-closed';
import { GateScreen } from './gate-screen';
import { useGate } from './use-gate';

const hashSecret = () => window.location.hash.slice(1);
const onHash = (listener: () => void) => {
  window.addEventListener('hashchange', listener);
  return () => window.removeEventListener('hashchange', listener);
};

/** The gate on a helper's phone. The pass stands in the fragment, is exchanged once, and leaves the address at once. */
export function GateApp() {
  const [client] = useState(() => new QueryClient());
  const secret = useSyncExternalStore(onHash, hashSecret, () => null);
  if (secret === null) return <GateClosed sentence="Opening the gate." />;
  return (
    <QueryClientProvider client={client}>
      <PassDoor secret={secret} keep={window.localStorage} />
    </QueryClientProvider>
  );
}

type PassDoorProps = { secret: string; keep: Keep };

/** Turns a pass into this phone's own key, or says why not. */
function PassDoor({ secret, keep }: PassDoorProps) {
  const [firstSecret] = useState(secret);
  const wanted = secret || firstSecret;
  const { data, error, refetch } = useQuery({
    queryKey: ['gate-pass', wanted],
    queryFn: async () => {
      if (wanted === '') return openedKey(keep) ?? '';
      const key = keyForExchange(keep);
      await gateApi.exchange(wanted, key);
      rememberOpened(keep, key);
      window.history.replaceState(null, '', window.location.pathname); // no history keeps the pass
      return key;
    },
    staleTime: Infinity,
    retry: false,
    refetchOnWindowFocus: false,
    networkMode: 'always',
  });
  if (error instanceof GateRefused) return <GateClosed sentence={error.message} />;
  if (error) return <GateClosed sentence="No signal just now. Walk to where there is some, then try again." press={{ words: 'Try again', onPress: () => void refetch() }} />;
  if (data === undefined) return <GateClosed sentence="Opening the gate." />;
  if (data === '') return <GateClosed sentence="Open the link of your gate pass on this phone. The coordinator has it." />;
  return <OpenGate key={data} deviceKey={data} keep={keep} />;
}

function OpenGate({ deviceKey, keep }: { deviceKey: string; keep: Keep }) {
  const state = useGate(deviceKey, keep);
  if (state.at === 'refused') return <GateClosed sentence={state.sentence} />;
  if (state.at === 'waiting') return <GateClosed sentence={state.hasSignal ? 'Fetching the list.' : 'No signal yet. The list is fetched as soon as there is some.'} />;
  return <GateScreen gate={state.gate} keep={keep} />;
}
