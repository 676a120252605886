import { generateKeyPairSync, sign, type KeyObject } from 'node:crypto';
import { describe, expect, test } from 'vitest';
import { readCode } from '@/components/gate/read-code';
import { encodeTicket, type TicketFacts } from '@/lib/bookings/rules/ticket-payload';
import { gateList } from '@/lib/gate/schema';
import { at } from './cast';

const HERE = '11111111-1111-4111-8111-111111111111';
const ELSEWHERE = '33333333-3333-4333-8333-333333333333';
const VISIT = '22222222-2222-4222-8222-222222222222';

const club = generateKeyPairSync('ed25519');
const forger = generateKeyPairSync('ed25519');
const paper: TicketFacts = {
  keyId: 1, clubId: HERE, visitId: VISIT, visitVersion: 1, stopId: HERE, stopNumber: 3, entryAt: at('11:30'), graceMinutes: 20, adults: 2, children: 1, babes: 0,
};
const codeOf = (facts: Partial<TicketFacts> = {}, key: KeyObject = club.privateKey) => encodeTicket({ ...paper, ...facts }, (bytes) => sign(null, bytes, key));

const iso = (time: string) => at(time).toISOString();
const listed = { visitId: VISIT, stopId: HERE, stopNumber: 3, heldOn: '2027-05-15', opensAt: iso('13:00'), graceUntil: iso('13:20'), givenBackAt: null, adults: 2, children: 0, babes: 0, name: 'Eve', code: '7Q2MXK4D', version: 2 };
const list = (parties: object[] = [listed]) => gateList.parse({
  version: 'one', madeAt: iso('11:00'), deviceId: 'this', garden: 'Saltmarsh', dayName: 'Test day',
  here: { stopId: HERE, stopNumber: 3, heldOn: '2027-05-15', headsLimit: 28, earlyMinutes: 0, babes: 'not counted', calledOff: false },
  time: { timeZone: 'UTC', locale: 'en', hourCycle: 'h23' }, parties, facts: [], keys: [{ keyId: 1, publicKey: club.publicKey.export({ format: 'jwk' }).x }],
});

const noSignal = async () => Promise.reject(new TypeError('Failed to fetch'));
const serverSays = (ticket: Awaited<ReturnType<typeof readCode>>) => async () => ({ ticket });

describe('what a shown code stands for', () => {
  test('a ticket on the list is judged by the list, which is newer than the paper, without asking anyone', async () => {
    expect(await readCode(codeOf(), list(), noSignal)).toMatchObject({ opensAt: at('13:00'), children: 0 });
  });

  test('a code that another key signed is not one of ours, even with a visit that is on the list', async () => {
    expect(await readCode(codeOf({}, forger.privateKey), list(), noSignal)).toBeNull();
  });

  test('text that is no ticket is not one of ours, without asking anyone', async () => {
    expect(await readCode('HTTPS://ELSEWHERE.EXAMPLE', list(), noSignal)).toBeNull();
  });

  test('a ticket for another garden is asked of the server, which knows where it was moved', async () => {
    const moved = { ...paper, heldOn: '2027-05-15', opensAt: at('14:00'), graceUntil: at('14:20'), givenBackAt: null, stopId: ELSEWHERE, stopNumber: 5 };

    expect(await readCode(codeOf({ stopId: ELSEWHERE, stopNumber: 4 }), list([]), serverSays(moved))).toMatchObject({ stopNumber: 5 });
  });

  test('without signal a ticket that is not on the list says itself where and when it is for', async () => {
    expect(await readCode(codeOf({ stopId: ELSEWHERE, stopNumber: 4 }), list([]), noSignal))
      .toMatchObject({ stopId: ELSEWHERE, stopNumber: 4, heldOn: '2027-05-15', opensAt: at('11:30'), graceUntil: at('11:50'), adults: 2, children: 1 });
  });

  test('a key made since the list is the server’s to know, and without signal nothing is guessed', async () => {
    const byNewKey = codeOf({ keyId: 2 });

    expect(await readCode(byNewKey, list(), serverSays(null))).toBeNull();
    await expect(readCode(byNewKey, list(), noSignal)).rejects.toThrow('Failed to fetch');
  });
});
