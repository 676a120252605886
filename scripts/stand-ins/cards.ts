// Stands in for the card processor: started by scripts/start and by the tests, never in a live club.
// CARDS_PORT, CARDS_FILE, CARDS_WEBHOOK_URL and STRIPE_WEBHOOK_SECRET say where, and to whom it tells what happened.
import { Cards } from './cards/cards';
import { serveCards } from './cards/server';

const { CARDS_PORT, CARDS_FILE, CARDS_WEBHOOK_URL: url, STRIPE_WEBHOOK_SECRET: secret, CLOCK_OFFSET_FILE } = process.env;

const cards = new Cards({ file: CARDS_FILE ?? null, hook: url && secret ? { url, secret } : null, clockOffsetFile: CLOCK_OFFSET_FILE ?? null });
const { server, origin } = await serveCards(cards, Number(CARDS_PORT ?? 0));
console.log(`cards stand-in at ${origin}`);

function stop() {
  cards.stop();
  server.close(() => process.exit(0));
  server.closeAllConnections();
}
process.on('SIGTERM', stop);
process.on('SIGINT', stop);
