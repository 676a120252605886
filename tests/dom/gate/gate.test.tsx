import { act } from 'react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { GateApp } from '@/components/gate/gate-app';
import { press, show, type } from '../ui/stage';
import { aGateServer, aParty, theirFact } from './gate-server';

const good = aParty('Okonjo-Hale', -4);
const early = aParty('Brannock', 16, { adults: 2, children: 0 });
const used = aParty('McAvity-Osei', -10);
const list = [good, early, used];

const words = (at: HTMLElement) => (at.textContent ?? '').replace(/\s+/g, ' ');
const buttons = (at: HTMLElement) => [...at.querySelectorAll('button')];
const nameOf = (button: HTMLButtonElement) => button.getAttribute('aria-label') ?? (button.textContent ?? '').trim();
const button = (at: HTMLElement, name: string) => {
  const found = buttons(at).find((each) => nameOf(each) === name || nameOf(each).includes(name));
  if (!found) throw new Error(`no button "${name}" among: ${buttons(at).map(nameOf).join(' | ')}`);
  return found;
};
const keys = (at: HTMLElement) => buttons(at).map(nameOf).filter((name) => /^[A-Z0-9]$/.test(name)).join('');
const box = (at: HTMLElement) => {
  const input = at.querySelector('input');
  if (!input) throw new Error('no box');
  return input;
};

/** Waits for what the network brings: React is told that no one presses anything meanwhile. */
async function until(check: () => void) {
  Object.assign(globalThis, { IS_REACT_ACT_ENVIRONMENT: false });
  await vi.waitFor(check).finally(() => Object.assign(globalThis, { IS_REACT_ACT_ENVIRONMENT: true }));
}

/** A phone that followed a gate pass and stands at the gate. */
async function aGate() {
  const at = show(<GateApp />);
  await until(() => expect(words(at)).toContain('Find by name or code'));
  return at;
}

/** Finds a party by typing and pressing it. */
async function find(at: HTMLElement, typed: string, name: string) {
  await press(button(at, 'Find by name or code'));
  await type(box(at), typed);
  await press(button(at, name));
}

describe('the gate on a phone', () => {
  beforeEach(() => {
    localStorage.clear();
    window.history.replaceState(null, '', '/gate#a-secret-of-a-gate-pass');
  });
  afterEach(() => vi.unstubAllGlobals());

  it('exchanges its pass once and leaves it out of the address', async () => {
    const server = aGateServer({ parties: list });

    await aGate();

    expect(server.keys).toHaveLength(1);
    expect(server.keys[0]).toMatch(/^[\w-]{43}$/);
    expect(window.location.href).not.toContain('secret');
  });

  it('opens without the link the next time', async () => {
    const server = aGateServer({ parties: list });
    await aGate();

    await aGate();

    expect(server.keys).toHaveLength(1);
  });

  it('says how to open it when there is no pass', async () => {
    window.history.replaceState(null, '', '/gate');
    aGateServer({ parties: list });

    const at = show(<GateApp />);

    await until(() => expect(words(at)).toContain('Open the link of your gate pass on this phone.'));
  });

  it('says in one sentence that it has no camera, and that names and codes still work', async () => {
    aGateServer({ parties: list });

    const at = await aGate();

    await until(() => expect(words(at)).toContain('This phone shows no camera here: find each party by name or code.'));
  });

  it('has keys only for letters that lead to a party on its list', async () => {
    aGateServer({ parties: list });
    const at = await aGate();

    await press(button(at, 'Find by name or code'));
    expect(keys(at)).toBe('BHMO');

    await press(button(at, 'M'));
    expect(keys(at)).toBe('C');
    expect(words(at)).toContain('1 of 3 parties');
  });

  it('finds by code with keys of its own', async () => {
    aGateServer({ parties: [aParty('Okonjo-Hale', -4, { code: '7Q2MXK4D' }), aParty('Brannock', 16, { code: '7R2MXK4E' })] });
    const at = await aGate();
    await press(button(at, 'Find by name or code'));

    await press(button(at, 'Code'));
    expect(keys(at)).toBe('7');
    await press(button(at, '7'));

    expect(keys(at)).toBe('QR');
  });

  it('waits with a good ticket for one press on its number, and says who is in', async () => {
    const server = aGateServer({ parties: list });
    const at = await aGate();

    await find(at, 'OK', 'Okonjo-Hale');
    expect(server.sent).toEqual([]);
    await press(button(at, 'Let in 3'));

    expect(words(at)).toMatch(/Three in at \d\d:\d\d/);
    await until(() => expect(server.sent).toEqual([expect.objectContaining({ kind: 'admit', visitId: good.visitId, adults: 2, children: 1 })]));
    expect(buttons(at).map(nameOf)).toContain('Take that back');
  });

  it('writes one admission down on a double tap', async () => {
    const server = aGateServer({ parties: list });
    const at = await aGate();
    await find(at, 'OK', 'Okonjo-Hale');
    const number = button(at, 'Let in 3');

    await act(async () => {
      number.click();
      number.click();
    });

    await until(() => expect(server.sent).not.toEqual([]));
    await until(() => expect(server.asked.at(-1)).toBe('/api/gate/list'));
    expect(server.sent).toHaveLength(1);
  });

  it('takes an admission back, and lets the party in again under a new one', async () => {
    const server = aGateServer({ parties: list });
    const at = await aGate();
    await find(at, 'OK', 'Okonjo-Hale');
    await press(button(at, 'Let in 3'));

    await press(button(at, 'Take that back'));
    expect(buttons(at).map(nameOf)).toContain('Let in 3');
    await press(button(at, 'Let in 3'));

    await until(() => expect(server.sent.map(({ kind }) => kind)).toEqual(['admit', 'undo', 'admit']));
    expect(server.sent[1]?.undoesId).toBe(server.sent[0]?.id);
    expect(server.sent[2]?.id).not.toBe(server.sent[0]?.id);
  });

  it('lets in some of a party, and the others later', async () => {
    const server = aGateServer({ parties: list });
    const at = await aGate();
    await find(at, 'OK', 'Okonjo-Hale');

    await press(button(at, 'Only some came'));
    await press(button(at, '2'));
    await press(button(at, 'Let in 2'));
    expect(words(at)).toMatch(/Two in at/);
    await find(at, 'OK', 'Okonjo-Hale');

    expect(buttons(at).map(nameOf)).toContain('Let in 1');
    await until(() => expect(server.sent).toMatchObject([{ kind: 'admit', adults: 2, children: 0 }]));
  });

  it('holds an early party at the gate, and lets it in with a reason that is written down', async () => {
    const server = aGateServer({ parties: list });
    const at = await aGate();

    await find(at, 'BR', 'Brannock');
    expect(words(at)).toMatch(/Not yet: \d\d:\d\d/);
    expect(buttons(at).map(nameOf)).not.toContain('Let in 2');
    await press(button(at, 'Let them in and say why'));
    await press(button(at, 'The garden is quiet'));

    expect(words(at)).toMatch(/Two in at/);
    await until(() => expect(server.sent).toMatchObject([{ kind: 'refuse', verdict: 'early' }, { kind: 'admit', verdict: 'early', reason: 'The garden is quiet' }]));
  });

  it('offers a used ticket nothing but its story', async () => {
    aGateServer({ parties: list, facts: [theirFact(used.visitId)] });
    const at = await aGate();

    await find(at, 'MC', 'McAvity-Osei');
    expect(words(at)).toMatch(/Came in at \d\d:\d\d/);
    expect(buttons(at).map(nameOf)).toEqual(['See what this ticket did', 'Find by name or code', 'Next ticket']);
    await press(button(at, 'See what this ticket did'));

    expect(words(at)).toContain('Let in 2 adults and 1 child by the other phone.');
  });

  it('in a full garden lets one in for one out', async () => {
    const server = aGateServer({ parties: list, headsLimit: 4, facts: [theirFact(used.visitId), theirFact(null, { kind: 'walk-up', adults: 1, children: 0 })] });
    const at = await aGate();
    await find(at, 'OK', 'Okonjo-Hale');
    expect(words(at)).toContain('Full: one out, one in');

    for (let out = 0; out < 3; out += 1) await press(button(at, 'One came out'));

    expect(buttons(at).map(nameOf)).toContain('Let in 3');
    await until(() => expect(server.sent.filter(({ kind }) => kind === 'count-out')).toHaveLength(3));
  });

  it('says so when the other phone was first, and lets nobody in', async () => {
    const server = aGateServer({ parties: list });
    const at = await aGate();
    await find(at, 'OK', 'Okonjo-Hale');
    server.turnDown = true;

    await press(button(at, 'Let in 3'));

    await until(() => expect(words(at)).toContain('The other phone was first, so nobody was let in here.'));
    expect(words(at)).not.toContain('Three in at');
  });

  it('keeps what was done without a signal, says how much, and sends it once when there is one', async () => {
    const server = aGateServer({ parties: list });
    const at = await aGate();
    await find(at, 'OK', 'Okonjo-Hale');
    server.isAway = true;

    await press(button(at, 'Let in 3'));
    await until(() => expect(words(at)).toContain('No signal: 1 kept here'));
    expect(words(at)).toMatch(/Three in at/);
    server.isAway = false;
    await press(button(at, 'Next ticket'));
    await press(button(at, 'One came out'));

    await until(() => expect(server.sent.map(({ kind }) => kind)).toEqual(['admit', 'count-out']));
    await until(() => expect(words(at)).toContain('list from'));
  });

  it('is closed with one sentence when its pass is taken back', async () => {
    const server = aGateServer({ parties: list });
    const at = await aGate();
    server.isRevoked = true;

    await press(button(at, 'One came out'));

    await until(() => expect(words(at)).toContain('This gate pass was taken back. Ask the coordinator for a new one.'));
    expect(words(at)).not.toContain('Okonjo');
  });

  it('asks for the address only when pressed', async () => {
    const server = aGateServer({ parties: list });
    const at = await aGate();
    await press(button(at, 'Where we are'));
    expect(server.asked).not.toContain('/api/gate/place');

    await press(button(at, 'Show the address'));

    await until(() => expect(words(at)).toContain('9 Invented Row'));
  });

  it('turns black on white for the sun and stays so', async () => {
    aGateServer({ parties: list });
    const at = await aGate();

    await press(button(at, 'Black on white'));
    expect(at.querySelector('main')?.dataset['sun']).toBe('yes');

    expect((await aGate()).querySelector('main')?.dataset['sun']).toBe('yes');
  });
});
