/** The class that sets a stop's pasteboard colour (`--card`), by its number 1 to 14. */
export const cardClass = (stopNumber: number): string => `card-${stopNumber}`;

/** Whether a stop's card is woven: from the eighth on the seven colours come again with a stripe. */
export const isWoven = (stopNumber: number): boolean => stopNumber > 7;

/** The classes of a card drawn in HTML: colour, and the woven stripe where it belongs. */
export const pasteboard = (stopNumber: number): string => `${cardClass(stopNumber)} ${isWoven(stopNumber) ? 'woven' : 'pasteboard'}`;
