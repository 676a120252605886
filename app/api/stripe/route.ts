import { NextResponse } from 'next/server';
import { receiveEvent } from '@/lib/bookings/commands/events';
import { verifyEvent } from '@/lib/infra/cards';
import { log } from '@/lib/infra/log';
import { route } from '@/lib/web/route';

/** The card processor's webhook: believed only with its signature over the raw body. */
export const POST = route({
  name: '/api/stripe',
  requires: 'machine',
  raw: true,
  maxBytes: 512 * 1024,
  run: async ({ ctx, request, body }) => {
    const event = verifyEvent(body, request.headers.get('stripe-signature') ?? '');
    if (event === null) {
      log.warn('webhook with an unknown signature', { route: '/api/stripe' });
      return NextResponse.json({ message: 'That signature is not known here.' }, { status: 400 });
    }
    await receiveEvent(ctx, event);
    return { received: true };
  },
});
