import { refundRuleForAll } from '@/lib/bookings/rules/refund';
import { counted } from '@/lib/opendays/rules/words';

/** One part of the visiting page: sentences, and a list where there are things to mind. */
export type VisitingPart = { id: string; title: string; sentences: string[]; list: string[]; isCare: boolean };
export type VisitingPage = { main: VisitingPart[]; aside: VisitingPart[] };

type VisitingClub = {
  holdMinutes: number; holdsMayBeExtended: boolean; partyPeopleMax: number; partyVisitsMax: number; babesTakePlace: boolean; addressReleaseHours: number; changesEndMinutes: number;
  refundRules: { hoursBefore: number; percent: number }[]; visitRules: string; email: string;
};

const part = (id: string, title: string, sentences: string[], list: string[] = [], isCare = false): VisitingPart => ({ id, title, sentences, list, isCare });

/** The rules a party agrees to, one a line, as the club wrote them. */
export const ruleLines = (visitRules: string): string[] => visitRules.split('\n').map((line) => line.replace(/^[-*•]\s*/, '').trim()).filter((line) => line !== '');

const CARE = [
  'Trains do not see children, and small children do not always see trains. Stay within reach of yours; hands stay behind the edging.',
  'Ponds, pools and brooks are deep enough. Some are railed, none is guarded.',
  'A live-steam engine stays hot for an hour after its run. Where one is being filled or lit, stand back at least an arm and a half, and leave gas, spirit and matches to its driver.',
  'Rails and wires may carry low-voltage power, and sheds have mains. Nothing metal on the track; sheds are for the host.',
  'On a hot day there is more sun than shade: bring water and a hat, and sit before you need to.',
  'When thunder is heard, everybody goes indoors or to a car, and stays for half an hour after the last of it.',
  'The host’s word goes before anything written here, and local codes go before both. If something looks unsafe, tell the gate; it is taken seriously.',
];

const release = (hours: number): string => (hours % 24 === 0 ? counted(hours / 24, 'day', 'days') : counted(hours, 'hour', 'hours'));

/** What a visit is, in order, in the club's own figures. */
export function toVisitingPage(club: VisitingClub): VisitingPage {
  const longer = club.holdsMayBeExtended ? ' (longer if you ask)' : '';
  return {
    main: [
      part('how', 'How a visit works', [
        `You choose a garden and a time on the board of an open day, or several, and say how many of you there are: up to ${club.partyPeopleMax} people, up to ${counted(club.partyVisitsMax, 'visit', 'visits')} a day. The board says which times can be reached from the others.`,
        `The places are kept for you for ${club.holdMinutes} minutes${longer} while you give a name and pay. Then your tickets come by letter: one for each garden, with a square to scan and a code to say. On paper, on the telephone or by heart are all the same to the gate.`,
        'Come at your time, or a little after; the ticket says how little. Early is a walk round the block. Stay about as long as the garden says, since the next party has the same path.',
        club.babesTakePlace ? 'Babes in arms count as people, because the club says so.' : 'Babes in arms come along without taking a place.',
        'A party with children needs a grown-up in it.',
      ]),
      part('care', 'Take care', [], CARE, true),
      part('rules', 'What everybody agrees to', ['These are the rules you tick when you book.'], ruleLines(club.visitRules)),
      part('giving-back', 'Giving places back', [
        refundRuleForAll(club),
        'You do it yourself on your booking’s page, for all of you or some. It says what comes back before you press anything. If the club calls a day off, everything comes back.',
      ]),
    ],
    aside: [
      part('there', 'Getting there', [
        `Gardens are homes. Until ${release(club.addressReleaseHours)} before, the pages say which neighbourhood; then your letter brings the address and how to find the gate. Please do not pass it on.`,
        'The minutes on a post are by car between neighbourhoods, to the next five. On foot, ask yourself; you know your feet.',
      ]),
      part('access', 'Wheels, sticks and prams', [
        'Each garden’s page gives widths, steps, surfaces, seats and whether there is a loo, in figures, as its host measured them. The board can show step-free gardens only.',
        `Private gardens vary, and a figure is not a promise. If one of them decides your day, write to ${club.email} before you book and someone will go and look.`,
      ]),
      part('photographs', 'Photographs', [
        'Of trains, as many as you like. Of people, ask; of children, ask whoever brought them. House numbers, doors and cars stay out of the picture, and so off the internet.',
      ]),
      part('dogs', 'Dogs', ['Some hosts have one, some have hens. A garden’s page says whether yours may come, always on a short lead. Dogs that help people are welcome everywhere; tell the gate.']),
      part('weather', 'Weather', ['Trains run in drizzle and so do we. In wind, heat or thunder a garden may shut for a while or for the day; the gate and your letters say so.']),
      part('print', 'Large print', ['Every page has a large-print version: the link stands at the top and at the foot, and this browser remembers it. “Printed sheet” puts a page on paper.']),
    ],
  };
}
