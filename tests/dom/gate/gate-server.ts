import { vi } from 'vitest';

type Sent = { id: string; kind: string; visitId: string | null; undoesId: string | null; adults: number; children: number; babes: number; at: string; verdict: string | null; reason: string | null };

const inMinutes = (minutes: number) => new Date(Date.now() + minutes * 60_000).toISOString();
export const STOP = '11111111-1111-4111-8111-111111111111';

let made = 0;
/** A party on the list whose entry time opens in so many minutes, by the wire format. */
export const aParty = (name: string, opensInMinutes: number, changes: object = {}) => {
  made += 1;
  return {
    visitId: `22222222-2222-4222-8222-${String(made).padStart(12, '0')}`, stopId: STOP, stopNumber: 3, heldOn: '2027-05-15', opensAt: inMinutes(opensInMinutes),
    graceUntil: inMinutes(opensInMinutes + 20), givenBackAt: null, adults: 2, children: 1, babes: 0, name, code: '7Q2MXK4D', version: 1, ...changes,
  };
};

/**
 * The club's server as a phone meets it over the network: it answers the gate's addresses in the wire format, keeps
 * each fact once, and can be out of reach. What it decides is the server's own tests' business: `turnDown` says it.
 */
export function aGateServer({ parties, headsLimit = 28, facts = [] }: { parties: ReturnType<typeof aParty>[]; headsLimit?: number; facts?: object[] }) {
  const server = { sent: [] as Sent[], keys: [] as string[], asked: [] as string[], isAway: false, turnDown: false, isRevoked: false };
  const listed = [...facts];
  const answer = (status: number, body: object) => new Response(JSON.stringify(body), { status });
  vi.stubGlobal('fetch', async (path: string, init: RequestInit) => {
    server.asked.push(path);
    if (server.isAway) throw new TypeError('Failed to fetch');
    const body = typeof init.body === 'string' ? JSON.parse(init.body) : {};
    if (path === '/api/gate/device') {
      server.keys.push(body.deviceKey);
      return answer(200, { number: 1 });
    }
    if (server.isRevoked) return answer(401, { refused: 'pass_revoked', message: 'This gate pass was taken back. Ask the coordinator for a new one.' });
    if (path === '/api/gate/facts') {
      for (const fact of body.facts) {
        server.sent.push(fact);
        listed.push({ ...fact, kind: server.turnDown ? 'refuse' : fact.kind, deviceId: 'this' });
      }
      return answer(200, { answers: body.facts.map(({ id }: Sent) => ({ id, outcome: server.turnDown ? 'refused' : 'kept', reason: null })) });
    }
    if (path === '/api/gate/place') return answer(200, { garden: 'Saltmarsh', address: '9 Invented Row', directions: null, lat: 1, lon: -2 });
    return answer(200, {
      version: 'one', madeAt: new Date().toISOString(), deviceId: 'this', garden: 'Saltmarsh', dayName: 'Test day',
      here: { stopId: STOP, stopNumber: 3, heldOn: '2027-05-15', headsLimit, earlyMinutes: 0, babes: 'not counted', calledOff: false },
      time: { timeZone: 'UTC', locale: 'en-US', hourCycle: 'h23' }, parties, facts: listed, keys: [],
    });
  });
  return server;
}

/** A fact of the other phone, by the wire format. */
export const theirFact = (visitId: string | null, changes: object = {}) => ({
  id: crypto.randomUUID(), kind: 'admit', undoesId: null, visitId, adults: 2, children: 1, babes: 0, at: inMinutes(-2), deviceId: 'other', reason: null, ...changes,
});
