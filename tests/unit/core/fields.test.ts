import { describe, expect, it } from 'vitest';
import { dayField, emailField, headsField, isEmail, notesField, phoneField, textField, tickField, wholeField } from '@/lib/core/fields';

const sentence = (result: { success: boolean; error?: { issues: { message: string }[] } }) => result.error?.issues[0]?.message;

describe('what people type', () => {
  it.each([['2', 2], ['', 0], [undefined, 0], [' 3 ', 3], ['99', 99]])('heads %j are %d', (typed, expected) => {
    expect(headsField.parse(typed)).toBe(expected);
  });

  it.each(['-1', '1e9', '3.5', '1000000000', 'two', '0x10', '１', '100'])('heads %j are refused with what to do', (typed) => {
    expect(sentence(headsField.safeParse(typed))).toBe('Type a whole number of people, from 0 to 99.');
  });

  it.each([
    ['"two words"@place.example', true], ['first.last+garden@place.example', true], ["o'brien@place.example", true], ['a@b.example', true],
    ['no-at.example', false], ['a@b', false], ['.a@b.example', false], ['a..b@c.example', false], ['a@-b.example', false], ['a b@c.example', false], [`${'a'.repeat(65)}@b.example`, false],
    [`a@${'b'.repeat(250)}.example`, false], ['a@b.example\r\nBcc: c@d.example', false],
  ])('%j is an address we can write to: %s (RFC 5321 section 4.5.3.1)', (typed, expected) => {
    expect(isEmail(typed)).toBe(expected);
  });

  it('asks for an address where none was typed, and says what is wrong with one that was', () => {
    expect(sentence(emailField.safeParse('  '))).toBe('Type an e-mail address.');
    expect(sentence(emailField.safeParse('ada at home'))).toContain('looks like name@place.example');
  });

  it('keeps a local part as typed and writes the domain small', () => {
    expect(emailField.parse('  Ada.F@Place.EXAMPLE ')).toBe('Ada.F@place.example');
  });

  it('keeps emoji, four-byte letters and right-to-left names, and drops what would turn or break a line', () => {
    const name = textField('a name');

    expect(name.parse('𝒜da 🚂 عبد')).toBe('𝒜da 🚂 عبد');
    expect(name.parse('Ada\u202e\r\nBcc: x')).toBe('Ada Bcc: x');
  });

  it('counts letters, not bytes, and says how many too many', () => {
    const name = textField('a name', 300);

    expect(name.safeParse('🚂'.repeat(300)).success).toBe(true);
    expect(sentence(name.safeParse('x'.repeat(301)))).toBe('That is longer than 300 characters. Shorten it a little.');
    expect(sentence(name.safeParse('   '))).toBe('Type a name.');
  });

  it('reads a tick as the browser sends it and nothing else', () => {
    expect([tickField.parse('on'), tickField.parse(undefined), tickField.parse('false')]).toEqual([true, false, false]);
    expect(tickField.safeParse('yes please').success).toBe(false);
  });

  it('keeps the lines of a note', () => {
    expect(notesField().parse('one\r\ntwo\u0000')).toBe('one\ntwo');
    expect(notesField().parse('  ')).toBeNull();
  });

  it.each([['+1 555 0100', true], ['', true], ['abc', false], ['12', false]])('a telephone number %j: %s', (typed, expected) => {
    expect(phoneField.safeParse(typed).success).toBe(expected);
  });

  it.each([['2027-05-15', true], ['1900-01-01', true], ['2199-12-31', true], ['1899-12-31', false], ['0000-01-01', false], ['9999-12-31', false], ['2027-02-29', false], ['', false]])('a day %j: %s', (typed, expected) => {
    expect(dayField.safeParse(typed).success).toBe(expected);
  });

  it('reads whole numbers within their bounds only', () => {
    const minutes = wholeField({ min: 1, max: 60 });

    expect(minutes.parse('60')).toBe(60);
    for (const typed of ['0', '61', '', '1.5', '1e1']) expect(minutes.safeParse(typed).success).toBe(false);
  });
});
