import { describe, expect, test } from 'vitest';
import { keyForExchange, openedKey, rememberOpened, type Keep } from '@/components/gate/device';
import { openOutbox, type NewFact } from '@/components/gate/outbox';

/** A phone's storage. */
function aPhone(): Keep {
  const kept = new Map<string, string>();
  return { getItem: (name) => kept.get(name) ?? null, setItem: (name, value) => void kept.set(name, value), removeItem: (name) => void kept.delete(name) };
}

const fact = (id: string, changes: Partial<NewFact> = {}): NewFact => ({
  id, kind: 'count-out', undoesId: null, visitId: null, adults: 1, children: 0, babes: 0, at: '2027-05-15T11:34:00.000Z', verdict: null, reason: null, ...changes,
});

/** A server that keeps everything, or is out of reach, or turns facts down. */
function aServer() {
  const server = { batches: [] as string[][], isAway: false, outcome: 'kept' as 'kept' | 'refused' };
  const send = async (facts: readonly NewFact[]) => {
    if (server.isAway) throw new TypeError('Failed to fetch');
    server.batches.push(facts.map(({ id }) => id));
    return { answers: facts.map(({ id }) => ({ id, outcome: server.outcome, reason: server.outcome === 'kept' ? null : 'not_on_ticket' })) };
  };
  return { server, send };
}

describe('the outbox of a gate’s phone', () => {
  test('keeps a fact once however often it is put in', () => {
    const outbox = openOutbox(aPhone(), 'box', aServer().send);

    outbox.add(fact('a'));
    outbox.add(fact('a'));

    expect(outbox.facts()).toHaveLength(1);
  });

  test('sends in the order things were done, once', async () => {
    const { server, send } = aServer();
    const outbox = openOutbox(aPhone(), 'box', send);
    outbox.add(fact('a'));
    outbox.add(fact('b'));

    await Promise.all([outbox.flush(), outbox.flush()]);
    await outbox.flush();

    expect(server.batches).toEqual([['a', 'b']]);
  });

  test('keeps what could not go, over a reload, and sends it later', async () => {
    const phone = aPhone();
    const { server, send } = aServer();
    const outbox = openOutbox(phone, 'box', send);
    server.isAway = true;
    outbox.add(fact('a'));
    await expect(outbox.flush()).rejects.toThrow();

    const afterReload = openOutbox(phone, 'box', send);
    server.isAway = false;
    await afterReload.flush();

    expect(server.batches).toEqual([['a']]);
    expect(afterReload.facts()).toMatchObject([{ id: 'a', isSent: true }]);
  });

  test('turns what the server turned down into a refusal', async () => {
    const { server, send } = aServer();
    const outbox = openOutbox(aPhone(), 'box', send);
    server.outcome = 'refused';
    outbox.add(fact('a', { kind: 'admit', visitId: 'v1' }));

    await outbox.flush();

    expect(outbox.facts()).toMatchObject([{ id: 'a', kind: 'refuse', verdict: 'not_on_ticket' }]);
  });

  test('lets go of a fact only when it was sent and the list holds it', async () => {
    const { send } = aServer();
    const outbox = openOutbox(aPhone(), 'box', send);
    outbox.add(fact('a'));
    outbox.drop(new Set(['a']));
    expect(outbox.facts()).toHaveLength(1);

    await outbox.flush();
    outbox.drop(new Set(['another']));
    expect(outbox.facts()).toHaveLength(1);
    outbox.drop(new Set(['a']));

    expect(outbox.facts()).toEqual([]);
  });

  test('begins empty when the storage holds something else', () => {
    const phone = aPhone();
    phone.setItem('box', '{"not":"ours"}');

    expect(openOutbox(phone, 'box', aServer().send).facts()).toEqual([]);
  });
});

describe('the key of a gate’s phone', () => {
  test('is the same until its pass was exchanged, so a lost answer costs no second phone', () => {
    const phone = aPhone();
    const key = keyForExchange(phone);

    expect(keyForExchange(phone)).toBe(key);
    expect(openedKey(phone)).toBeNull();
    rememberOpened(phone, key);

    expect(openedKey(phone)).toBe(key);
  });

  test('is a new one for a new pass', () => {
    const phone = aPhone();
    const key = keyForExchange(phone);
    rememberOpened(phone, key);

    expect(keyForExchange(phone)).not.toBe(key);
  });
});
