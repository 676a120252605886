import { box, disc, f, line, shape, times, type Cuts } from './cut';

/** The life-sized things, one of which stands in every plate so that the eye knows how small the train is. */
export const JOKE_NAMES = ['boot', 'robin', 'can', 'hand', 'cat', 'snail', 'mug', 'trowel', 'hedgehog', 'pot', 'apple', 'ball'] as const;
export type JokeName = (typeof JOKE_NAMES)[number];

/** What a joke is called in a sentence, and how far it reaches from its own nought, in centimetres. */
export const JOKE_FACTS: Readonly<Record<JokeName, { readonly words: string; readonly left: number; readonly right: number; readonly height: number }>> = {
  boot: { words: 'boot', left: 0, right: 30, height: 31 },
  robin: { words: 'robin', left: 0, right: 22, height: 15 },
  can: { words: 'watering can', left: -8, right: 39, height: 29 },
  hand: { words: 'child’s hand', left: -11, right: 26, height: 17 },
  cat: { words: 'cat', left: -1, right: 28, height: 30 },
  snail: { words: 'snail', left: 0, right: 6, height: 5 },
  mug: { words: 'mug of tea', left: -0.5, right: 12, height: 15 },
  trowel: { words: 'trowel', left: -4, right: 4, height: 31 },
  hedgehog: { words: 'hedgehog', left: 0, right: 27, height: 13 },
  pot: { words: 'flowerpot', left: -1, right: 16, height: 36 },
  apple: { words: 'apple', left: -1, right: 9, height: 9 },
  ball: { words: 'ball', left: 0, right: 16, height: 16 },
};

const drawn: Record<JokeName, () => Cuts> = {
  boot: () => [
    ...shape('M1 0H10.5V-1.2L13-1.8 26-1.2C29.4-1.2 30.4-4 28.8-6.6 26.4-10 18.5-10.4 16-14.5L15.4-31H3L3.6-16C2.6-10 1-6 1 0Z'),
    ...line('M3.2-28.4h12', 0.7, 'paper'), ...line('M1.4-3.2C8-2.2 10-3.4 14-3.6L28.6-3.2', 0.5, 'paper'), ...line('M6-25.5L6.3-16C6-11 5-8 4.6-6', 0.8, 'paper'),
    ...line('M8.2-24v6M21.5-8.4c2.4.6 3.6 1.2 4.4 2.2', 0.5, 'paper'), ...box(12.2, -27, 2.2, 3.6, 'card'), ...line('M12.2-22h3', 0.4, 'paper'),
  ],
  robin: () => [
    ...line('M8-1L7.2 1.7M10.2-1L9.8 1.7M6 1.8h2.2M8.6 1.8h2.2', 0.45),
    ...shape('M-.2-9.4L2.2-10.9C3.2-14.6 8.4-15.4 11.2-12.2 14-9.4 15.6-7 15.2-5.2L22-7.2 21.6-4.8 14.2-2.2C11.4.8 5.6.4 3.4-3.4 2.2-5.6 2.4-7.4 2.2-8.4Z'),
    ...shape('M2.5-10.6C3.6-12.6 6.8-12 7.8-9 8.6-5.6 6.6-2 4.4-2.6 2.6-4.8 2.4-7.8 2.5-10.6Z', 'card'),
    ...line('M3.6-8.2l1.5.6M3.6-6.4l1.8.7M4.2-4.6l1.4.5', 0.3), ...disc(5.4, -11.3, 0.95, 'paper'), ...disc(5.4, -11.3, 0.55),
    ...line('M9.4-9.4C12.4-8.6 13.6-6.6 15-5M9.6-7.6C11.6-7 12.4-5.4 13.4-4.2M16-4.8l4.4-1.2', 0.42, 'paper'),
  ],
  can: () => [
    ...shape('M0 0H20L18.6-19H1.4Z'), ...line('M.6-3.6h19M1.2-15.6h17.4', 0.6, 'paper'), ...line('M19-5L34-23', 2.4),
    ...shape('M31-23.6L37.6-20.6 38.8-24.4 33.6-26.8Z'), ...line('M4-19C4-29 17-29 17-19M1-16C-8-15-8-4 .4-3', 1.3), ...line('M4.4-13v7', 0.8, 'card'),
  ],
  hand: () => [
    ...shape('M0-12.4L-10-11.2C-11.4-11-11.4-9.2-10-9L-2.4-9.2-3-8.6C-4.6-8-4.4-6-2.8-5.8L-2.4-5.6C-3.6-4.6-3-3-1.6-2.8L-1-2.6C-1.6-1.6-.8-.4.6-.4 4-.2 6-1.6 9-2L9-12C6-13 4-15.4 1.6-16.6.2-17.2-1-16-.2-14.8Z', 'paper', ' stroke="ink" stroke-width=".7"'),
    ...line('M-2.4-9.2L2-9M-2.8-5.8L1.6-6M-1.6-2.8L1.6-3.2', 0.5), ...shape('M9-1L26 2V-16L9-13Z'), ...line('M12.5-.8V-13.2M16-.2V-13.8M19.5.4V-14.4', 0.9, 'card'),
  ],
  cat: () => [
    ...line('M19-1.6C27-.4 30-8 26-13.6', 2.3),
    ...shape('M2 0C-1.6-8 1-16 5.4-18.6 3.4-20.6 3-23.4 3.6-25.2L3.2-30 7.2-27.6C9.4-28.4 12.6-28.4 14.8-27.6L18.8-30 18.4-25.2C19-23.4 18.6-20.6 16.6-18.6 21-16 23.6-8 20 0Z'),
    ...line('M7.4-15C5.6-11 5.4-6 6.2-2M14.6-15C16.4-11 16.6-6 15.8-2M11-25.6v3.4M8.6-25.4l.4 2.6M13.4-25.4l-.4 2.6M6-18.2C8-17 14-17 16-18.2M11-14v9', 0.5, 'paper'),
  ],
  snail: () => [
    ...shape('M0 0C2-.9 3-1 4.4-1.2L5-3C5.4-4 6.2-4 6.2-3L6-.6C5.8 0 5 .1 4.4.1Z'), ...disc(3.2, -2.4, 1.9),
    ...line('M3.2-2.4a.5.5 0 0 1 .5.6a1 1 0 0 1-1.6-.4a1.4 1.4 0 0 1 2.5-.8', 0.26, 'paper'), ...line('M5.5-3.6l-.3-1.2M6-3.5l.5-1.1', 0.22),
  ],
  mug: () => [
    ...shape('M0 0H8L8.4-9.5H-.4Z'), ...line('M8.2-7.6C12.6-8 12.4-2 8-2.4', 1.1), ...line('M.2-7h7.8M.4-2.4h7.4', 0.6, 'paper'), ...box(2, -5.8, 4, 2.4, 'card'),
    ...line('M2.2-11c-1-1.6 1-2.4 0-4M5.4-11c-1-1.6 1-2.4 0-4', 0.5),
  ],
  trowel: () => [
    ...shape('M0 0C-3.4-4-4-9-3.2-13H3.2C4-9 3.4-4 0 0Z'), ...line('M0-11V-4', 0.6, 'paper'), ...line('M0-13V-18', 1.2),
    ...shape('M-1.7-18H1.7L2.2-29C2.2-31-2.2-31-2.2-29Z'), ...line('M-1.6-20h3.2M-.6-27v4', 0.5, 'paper'),
  ],
  hedgehog: () => [
    ...shape('M0-1C-1-9 6-13 13-12 20-11 24-6 23-1L26-.4C27 .4 26 1 25 1H2Z'),
    ...line(Array.from({ length: 30 }, (_, i) => {
      const turn = 2.95 - i * 0.085;
      const reach = 11.6 + (i % 3) * 0.9;
      return `M${f(12 + Math.cos(turn) * reach * 0.72)} ${f(-1 - Math.sin(turn) * reach * 0.72)}L${f(12 + Math.cos(turn) * (reach + 1.4))} ${f(-1 - Math.sin(turn) * (reach + 0.8))}`;
    }).join(''), 0.5),
    ...times(16, (i) => line(`M${f(4 + (i % 8) * 2.2)} ${-4 - Math.floor(i / 8) * 3}l-.9-1.5`, 0.4, 'paper')), ...disc(21.8, -3, 0.55, 'paper'),
  ],
  pot: () => [
    ...shape('M2 0H13L15-14H0Z'), ...box(-1, -17, 17, 3.6), ...line('M1-10.6h13M-.6-13.8h16', 0.5, 'paper'), ...line('M7.5-17V-28', 0.8),
    ...shape('M4-28c-1-5 1-6 1.4-8l2.1 2.4L9.6-36c.4 2 2.4 3 1.4 8C9.6-25.6 5.4-25.6 4-28Z'), ...line('M7.5-33v5', 0.5, 'card'),
    ...shape('M7.5-17C3-20 2.6-24 3-27 6-25 7.4-22 7.5-17ZM7.5-17C12-19 12.6-22 12.4-25 9.4-24 7.6-21 7.5-17Z'),
  ],
  apple: () => [
    ...shape('M4-6.6C1-8-1.4-5.6-.8-2.6-.4-.4 2 .6 4 .1 6 .6 8.4-.4 8.8-2.6 9.4-5.6 7-8 4-6.6Z'), ...line('M4-6.4C4-7.6 4.4-8.6 5.2-9.2', 0.5),
    ...line('M.8-4.8C.8-3.2 1.2-2 2-1.2', 0.6, 'paper'), ...shape('M4.6-8C6-9.6 7.6-9.6 8.6-9 7.8-7.6 6-7 4.6-8Z'),
  ],
  ball: () => [
    ...disc(8, -8, 8), ...shape('M8-16C4-12 4-4 8 0 12-4 12-12 8-16Z', 'card'), ...line('M.4-9.6C4-8 12-8 15.6-9.6', 0.6, 'paper'),
  ],
};

/** One life-sized thing, its feet on y = 0, in centimetres. */
export const jokeOf = (name: JokeName): Cuts => drawn[name]();
