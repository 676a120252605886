import { z } from 'zod';
import { countLookUp, findBookingByLink } from '@/lib/bookings/access';
import { isSpokenCode } from '@/lib/bookings/rules/spoken-code';
import { hashSecret } from '@/lib/infra/secrets';
import { keepBookingLink, setLargePrint } from '@/lib/web/cookies';
import { route } from '@/lib/web/route';

/**
 * The private link of a letter: sets its cookie and goes to the clean address, in large print when the letter's other link
 * asks for it. A mail scanner that opens it uses nothing up.
 */
export const GET = route({
  name: '/bookings/[code]/link/[secret]',
  requires: 'anyone',
  input: z.object({ print: z.literal('large').optional() }),
  run: async ({ ctx, params, input }) => {
    const { code = '', secret = '' } = params;
    await countLookUp(ctx);
    const isCode = isSpokenCode(code);
    if (isCode && (await findBookingByLink(ctx.db, code, hashSecret(secret), ctx.now)) !== null) await keepBookingLink(code, secret);
    if (input.print === 'large') await setLargePrint();
    return new Response(null, {
      status: 303,
      headers: { Location: isCode ? `/bookings/${code}` : '/bookings', 'Referrer-Policy': 'no-referrer', 'Cache-Control': 'private, no-store', 'X-Robots-Tag': 'noindex' },
    });
  },
});
