// The stand-in's own pay page: one form, then perhaps the bank's question. Plain HTML; it works without JavaScript.
import type { Cards } from './cards';
import { parseForm, type Params } from './form';
import { TRIAL_CARDS } from './payments';
import type { Session } from './shapes';

export type PageAnswer = { status: number; html?: string; location?: string };

const escape = (text: string) => text.replace(/[&<>"']/g, (c) => `&#${c.charCodeAt(0)};`);
const textOf = (form: Params, name: string): string => {
  const value = form[name];
  return typeof value === 'string' ? value.trim() : '';
};

/** Answers GET and POST on /pay/<session>. */
export function answerPay(cards: Cards, method: string, path: string, body: string): PageAnswer | null {
  const match = /^\/pay\/(cs_test_\w+)(\/bank)?$/.exec(path);
  const session = match?.[1] ? cards.store.find('session', match[1]) : null;
  if (!match || !session) return path.startsWith('/pay/') ? { status: 404, html: page('No such payment', '<p>There is no payment page at this address.</p>') } : null;
  if (session.status === 'complete') return { status: 303, location: successUrl(session) };
  if (session.status === 'expired') return { status: 410, html: closed(session) };
  if (match[2]) return method === 'POST' ? bankAnswered(cards, session, parseForm(body)) : { status: 200, html: bankAsks(cards, session) };
  return method === 'POST' ? pressed(cards, session, parseForm(body)) : { status: 200, html: form(cards, session, {}, {}) };
}

function pressed(cards: Cards, session: Session, sent: Params): PageAnswer {
  const number = textOf(sent, 'number').replace(/[\s-]/g, '');
  const email = session.customer_email ?? textOf(sent, 'email');
  const wrong: Record<string, string> = {};
  if (!/^\d{13,19}$/.test(number) || !passesLuhn(number)) wrong['number'] = 'Check the number: one of its digits is wrong or missing.';
  if (!isFutureMonth(textOf(sent, 'until'), cards.store.now())) wrong['until'] = 'Write the month and year from the card, like 12/34, not yet over.';
  if (!/^\d{3,4}$/.test(textOf(sent, 'check'))) wrong['check'] = 'Write the three digits from the back of the card.';
  if (!/^\S+@\S+$/.test(email)) wrong['email'] = 'Write an e-mail address.';
  if (Object.keys(wrong).length > 0) return { status: 422, html: form(cards, session, sent, wrong) };
  const result = cards.payments.pay(session, number, { email, name: textOf(sent, 'name') || null }, page0);
  if (result.outcome === 'asks') return { status: 303, location: `/pay/${session.id}/bank` };
  if (result.outcome === 'paid') return { status: 303, location: successUrl(session) };
  return { status: 402, html: form(cards, session, sent, { number: `${result.says ?? ''} Nothing was taken. Try another card.` }) };
}

function bankAnswered(cards: Cards, session: Session, sent: Params): PageAnswer {
  const result = cards.payments.answerBank(session, textOf(sent, 'answer') === 'yes', page0);
  if (result.outcome === 'paid') return { status: 303, location: successUrl(session) };
  return { status: 402, html: form(cards, cards.sessions.get(session.id), {}, result.says ? { number: `${result.says} Nothing was taken. Try another card.` } : {}) };
}

/** What the page does is nobody's interface request. */
const page0 = { requestId: null, key: null, apiVersion: '2026-10-28.endive' };

const successUrl = (session: Session) => session.success_url.replaceAll('{CHECKOUT_SESSION_ID}', session.id);

/** The check digit of card numbers (ISO/IEC 7812-1, annex B). */
export function passesLuhn(number: string): boolean {
  const sum = [...number].reverse().reduce((total, digit, index) => {
    const value = Number(digit) * (index % 2 === 1 ? 2 : 1);
    return total + (value > 9 ? value - 9 : value);
  }, 0);
  return sum % 10 === 0;
}

function isFutureMonth(text: string, now: number): boolean {
  const match = /^(0?[1-9]|1[0-2])\s*\/\s*(?:20)?(\d\d)$/.exec(text);
  return match !== null && Date.UTC(2000 + Number(match[2]), Number(match[1])) / 1000 > now;
}

const money = (session: Session) => {
  const format = new Intl.NumberFormat('en', { style: 'currency', currency: session.currency });
  return format.format(session.amount_total / 10 ** (format.resolvedOptions().maximumFractionDigits ?? 2));
};

function form(cards: Cards, session: Session, sent: Params, wrong: Record<string, string>): string {
  const field = (name: string, label: string, value: string, more = '') => `
    <p class="field"><label for="${name}">${label}</label>
    ${wrong[name] ? `<span class="wrong" id="${name}-wrong">${escape(wrong[name])}</span>` : ''}
    <input id="${name}" name="${name}" value="${escape(value)}" ${more} ${wrong[name] ? `aria-invalid="true" aria-describedby="${name}-wrong"` : ''} required></p>`;
  const lines = cards.sessions.lines(session.id).map((line) => `<li>${line.quantity > 1 ? `${line.quantity} × ` : ''}${escape(line.description)}</li>`).join('');
  const minutes = Math.max(1, Math.floor((session.expires_at - cards.store.now()) / 60));
  return page(`Pay ${money(session)}`, `
    <ul class="lines">${lines}</ul>
    <form method="post" action="/pay/${session.id}" novalidate>
      ${session.customer_email ? `<p>For <strong>${escape(session.customer_email)}</strong></p>` : field('email', 'E-mail', textOf(sent, 'email'), 'type="email" autocomplete="email"')}
      ${field('number', 'Card number', textOf(sent, 'number'), 'inputmode="numeric" autocomplete="cc-number" list="trial" autofocus')}
      <datalist id="trial">${TRIAL_CARDS.map((card) => `<option value="${card.number}">${card.label}</option>`).join('')}</datalist>
      ${field('until', 'Good until (month/year)', textOf(sent, 'until') || '12/34', 'inputmode="numeric" autocomplete="cc-exp" size="7"')}
      ${field('check', 'Three digits from the back', textOf(sent, 'check') || '123', 'inputmode="numeric" autocomplete="cc-csc" size="5"')}
      <p class="field"><label for="name">Name on the card, if you like</label><input id="name" name="name" value="${escape(textOf(sent, 'name'))}" autocomplete="cc-name"></p>
      <p><button>Pay ${money(session)}</button> ${session.cancel_url ? `<a href="${escape(session.cancel_url)}">Go back without paying</a>` : ''}</p>
    </form>
    <p class="note">This page closes in ${minutes} ${minutes === 1 ? 'minute' : 'minutes'}.</p>
    <h2>Cards for trying it out</h2>
    <p>No money moves here: this page stands in for a card processor.</p>
    <dl>${TRIAL_CARDS.map((card) => `<dt>${card.number.replace(/(\d{4})(?=\d)/g, '$1 ')}</dt><dd>${card.label}</dd>`).join('')}</dl>`);
}

function bankAsks(cards: Cards, session: Session): string {
  return page('The bank asks: is this you?', `
    <p>A payment of <strong>${money(session)}</strong> with the card that ends in 3155.</p>
    <form method="post" action="/pay/${session.id}/bank">
      <p><button name="answer" value="yes">Yes, it is me</button> <button class="plain" name="answer" value="no">No, it is not</button></p>
    </form>`);
}

const closed = (session: Session) => page('This payment page has closed', `
  <p>Its time was over, and nothing was taken.</p>
  ${session.cancel_url ? `<p><a href="${escape(session.cancel_url)}">Go back</a></p>` : ''}`);

const page = (title: string, body: string) => `<!doctype html>
<html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width, initial-scale=1"><title>${escape(title)}</title>
<link rel="stylesheet" href="/sheet.css"></head><body><main><p class="bill">Card payments, stand-in</p><h1>${escape(title)}</h1>${body}</main></body></html>`;
