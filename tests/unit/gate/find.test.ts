import { describe, expect, test } from 'vitest';
import { codeProblem, findParties, keysOfName, padKeys } from '@/lib/gate/rules/find';

const list = [
  { name: 'Marchetti-Boyd', code: '7Q2MXK4D' },
  { name: 'Ada Mardle', code: '7Q9MXK4D' },
  { name: 'McAvity-Osei', code: 'B2345678' },
  { name: 'Łucja Øby', code: 'C2345678' },
  { name: 'Жанна Петрова', code: 'D2345678' },
  { name: '🚂🌿', code: 'E2345678' },
];
const names = (typed: string) => findParties(list, typed, 'name').hits.map(({ name }) => name);
const keys = (typed: string, by: 'name' | 'code' = 'name') => [...findParties(list, typed, by).nextKeys].sort().join('');

describe('finding a party by the keys', () => {
  test('before anything is typed every party is there, and only first letters that lead to one have keys', () => {
    expect(names('')).toHaveLength(5);
    expect(keys('')).toBe('ABLMOЖП');
  });

  test('a letter leaves those of whom a name begins with it, in order of name', () => {
    expect(names('M')).toEqual(['Ada Mardle', 'Marchetti-Boyd', 'McAvity-Osei']);
    expect(keys('M')).toBe('AC');
  });

  test('a first name, a surname and the second half of a double name all lead to the party', () => {
    expect([names('AD'), names('MARD'), names('BOY')]).toEqual([['Ada Mardle'], ['Ada Mardle'], ['Marchetti-Boyd']]);
  });

  test('letters run on over the gap between two names', () => {
    expect(names('ADAM')).toEqual(['Ada Mardle']);
  });

  test('accents, strokes and ligatures are typed as plain letters', () => {
    expect(names('LUC')).toEqual(['Łucja Øby']);
    expect(keysOfName('Ægir Strauß-Đorđević')).toEqual(['AEGIR', 'STRAUSS', 'DORDEVIC']);
  });

  test('a name in other letters has its own keys', () => {
    expect(names('ЖА')).toEqual(['Жанна Петрова']);
    expect(padKeys(list, 'name')).toContain('Ж');
  });

  test('a name without any letter is found by its code', () => {
    expect(keysOfName('🚂🌿')).toEqual([]);
    expect(findParties(list, 'E2', 'code').hits.map(({ name }) => name)).toEqual(['🚂🌿']);
  });

  test('a code is found from its beginning, and only characters that lead on have keys', () => {
    expect(keys('7Q', 'code')).toBe('29');
    expect(findParties(list, '7q2m xk4d', 'code').hits).toHaveLength(1);
  });

  test('a whole code leads no further', () => {
    expect(keys('7Q2MXK4D', 'code')).toBe('');
  });

  test('typing what nobody is called finds nobody', () => {
    expect(names('XYZ')).toEqual([]);
  });

  test('a code with a slip in it says so, and a good one of another garden says that', () => {
    expect(codeProblem('7Q2M XK4')).toBe('Our codes have eight letters and numbers; this has 7.');
    expect(codeProblem('U')).toContain('There is no letter U');
  });
});
