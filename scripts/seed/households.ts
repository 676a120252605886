/** How a demo household stands with its dues. `ahead`: next year's are paid too, once they are asked for. `left`: gone in spring. */
export type SeedStanding = 'paid' | 'ahead' | 'lapsed' | 'joining' | 'life' | 'left';
export type ClassKey = 'single' | 'household' | 'junior' | 'life';

/** A household of the demo club; its place in the list is its number on the roll. The first named is its contact; in the junior class everyone is a junior. */
export type SeedHousehold = {
  family: string;
  adults: readonly [string, ...string[]];
  juniors: readonly string[];
  classKey: ClassKey;
  standing: SeedStanding;
  joinedYearsAgo: number;
  /** How it paid this year. */
  method: 'card' | 'cheque' | 'cash' | 'transfer';
};

const of = (family: string, adults: SeedHousehold['adults'], classKey: ClassKey, standing: SeedStanding, joinedYearsAgo: number, method: SeedHousehold['method'], juniors: readonly string[] = []): SeedHousehold =>
  ({ family, adults, juniors, classKey, standing, joinedYearsAgo, method });

export const HOUSEHOLDS: readonly SeedHousehold[] = [
  of('Fennimore', ['Ada', 'Piers'], 'household', 'ahead', 22, 'card', ['Tess']),
  of('Okonjo', ['Ben', 'Lise'], 'household', 'paid', 3, 'card', ['Milo', 'Juno']),
  of('Haldane', ['Cleo'], 'single', 'ahead', 9, 'card'),
  of('Abara', ['Ife', 'Tobin'], 'household', 'paid', 17, 'transfer'),
  of('Castellane', ['Wren'], 'single', 'ahead', 12, 'card'),
  of('Dorrell', ['Dov', 'Miriam'], 'household', 'ahead', 14, 'cheque'),
  of('Abara', ['Nell'], 'single', 'paid', 8, 'card'),
  of('Quillfeather', ['Osgood'], 'life', 'life', 43, 'cheque'),
  of('Marchbank', ['Maud'], 'single', 'paid', 28, 'cheque'),
  of('Tarn', ['Elspeth', 'Giles'], 'household', 'paid', 6, 'card', ['Perry']),
  of('Oakhollow', ['Bram'], 'single', 'lapsed', 4, 'card'),
  of('Lindqvar', ['Jun', 'Petra'], 'household', 'paid', 35, 'transfer'),
  of('Swithin', ['Dilys'], 'single', 'paid', 11, 'cheque'),
  of('Pomfrey', ['Ned', 'Clemency'], 'household', 'paid', 5, 'card', ['Hal', 'Ivy', 'Bo']),
  of('Copperleigh', ['Rosalind'], 'single', 'ahead', 25, 'card'),
  of('Vantongeren', ['Sil', 'Marek'], 'household', 'paid', 2, 'card'),
  of('Thackway', ['Humphrey'], 'life', 'life', 40, 'cheque'),
  of('Dunlinson', ['Hollis', 'Bea'], 'household', 'paid', 13, 'card'),
  of('Applegarth', ['Nan'], 'single', 'paid', 19, 'cash'),
  of('Brightsea', ['Corin'], 'single', 'left', 7, 'card'),
  of('Gallowglass', ['Lorcan'], 'single', 'paid', 31, 'cheque'),
  of('Ibarrola', ['Xanti', 'Nerea'], 'household', 'paid', 4, 'transfer', ['Unai']),
  of('Peverell', ['Agnes'], 'single', 'lapsed', 10, 'cheque'),
  of('Nightinghall', ['Jory', 'Rue'], 'household', 'paid', 10, 'card'),
  of('Osterfold', ['Henrik'], 'single', 'paid', 3, 'card'),
  of('Tregellan', ['Morwenna', 'Jago'], 'household', 'ahead', 16, 'card', ['Keren']),
  of('Bellwain', ['Ottoline', 'Ray'], 'household', 'paid', 8, 'card', ['Fitz']),
  of('Sallow', ['Winnie'], 'single', 'paid', 21, 'cash'),
  of('Adeyinka', ['Folu', 'Sade'], 'household', 'paid', 2, 'card', ['Tayo', 'Bisi']),
  of('Curlewis', ['Sorrel'], 'single', 'paid', 19, 'transfer'),
  of('Hathersage', ['Tom', 'Winifred'], 'household', 'paid', 26, 'cheque'),
  of('Moravec', ['Zdenka'], 'single', 'lapsed', 5, 'card'),
  of('Inchbold', ['Averil', 'Kit'], 'household', 'ahead', 38, 'cheque'),
  of('Penhallow', ['Loveday'], 'single', 'paid', 6, 'card'),
  of('Farrowdale', ['Mick', 'Jean'], 'household', 'paid', 15, 'cheque'),
  of('Gorsefall', ['Ulla'], 'single', 'paid', 15, 'card'),
  of('Whinstone', ['Basil'], 'single', 'paid', 20, 'cash'),
  of('Okafor-Lunn', ['Chidi', 'Harriet'], 'household', 'paid', 1, 'card', ['Ada May']),
  of('Teasel', ['Juniper'], 'junior', 'paid', 1, 'cash'),
  of('Ramsbottle', ['Ernie'], 'life', 'life', 37, 'cheque'),
  of('Szabolc', ['Ilka', 'Dezi'], 'household', 'paid', 7, 'transfer'),
  of('Underhay', ['Pru'], 'single', 'paid', 9, 'card'),
  of('Fieldmouse', ['Toby'], 'junior', 'lapsed', 2, 'cash'),
  of('Greatorme', ['Alban', 'Sheila'], 'household', 'paid', 23, 'cheque'),
  of('Kestrelman', ['Roy'], 'single', 'paid', 12, 'card'),
  of('Lovibank', ['Etta', 'Moss'], 'household', 'joining', 0, 'card', ['Fern']),
  of('Mistlethwaite', ['Gwen'], 'single', 'paid', 18, 'cheque'),
  of('Nandakar', ['Priya', 'Arun'], 'household', 'paid', 3, 'card', ['Leela']),
  of('Orchardson', ['Cuthbert'], 'single', 'paid', 29, 'cash'),
  of('Plumtree', ['Dot', 'Len'], 'household', 'lapsed', 11, 'cheque'),
  of('Quickbeam', ['Sybil'], 'single', 'paid', 5, 'card'),
  of('Rainbird', ['Jack', 'Olive'], 'household', 'paid', 14, 'card', ['Pip']),
  of('Saltonstow', ['Verity'], 'single', 'joining', 0, 'card'),
  of('Tidewell', ['Bert', 'Mo'], 'household', 'paid', 33, 'cheque'),
  of('Umberley', ['Noel'], 'single', 'left', 16, 'cheque'),
  of('Vinepress', ['Tilda', 'Gus'], 'household', 'paid', 2, 'card'),
  of('Wagstone', ['Harold'], 'single', 'paid', 24, 'cash'),
  of('Yarrowby', ['Ines', 'Colm'], 'household', 'ahead', 6, 'card', ['Roo']),
  of('Zennick', ['Petroc'], 'single', 'paid', 4, 'transfer'),
  of('Hollyoake-Reed', ['Maribel', 'Stan'], 'household', 'joining', 0, 'card'),
];
