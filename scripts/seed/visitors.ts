/** People who come to open days without being members; all invented. */
export const VISITORS: readonly [string, ...string[]] = [
  'Aurelie Stopforth', 'Winton Babbacombe', 'Marguerite Oyelowo', 'Desmond Tarrowgate', 'Iris Featherley', 'Conrad Plimsole', 'Yusra Haddon', 'Barnaby Skelling', 'Opal Dringhouse', 'Fergus Mallowby', 'Noor Ellingham', 'Clement Housego',
  'Hattie Brindleway', 'Ottokar Venn', 'Lucinda Marrowfat', 'Ambrose Tidy', 'Kerensa Pollard-Wynne', 'Sunniva Aske', 'Rufus Bellcastle', 'Dorothea Wimpole', 'Matthias Ochre', 'Perpetua Snell', 'Gideon Larkrise', 'Zora Thimbleby',
  'Eamon Fallowfield', 'Beatrix Corncrake', 'Leopold Hush', 'Wilhelmina Strake', 'Chloe Partington-Ode', 'Jasper Nettlefold', 'Rhona Quince', 'Thaddeus Bloom', 'Ingrid Sallowmere', 'Percival Dewhurst-Lam', 'Mireille Oakapple', 'Stanley Wherry',
  'Amina Gladwell', 'Hector Pinfold', 'Josephine Tallow', 'Lars Meadowcroft', 'Oona Redshank', 'Cyrus Applebee', 'Millicent Drover', 'Ivo Castlemartin', 'Rosamund Teal', 'Benedikt Sorrelby', 'Nerys Cobblestone', 'Walter Umbridge-Poe',
];
