/* The product's tokens as letters need them: mail programs know no variables, so the values stand here once. */

/** Light values, written into each element; the dark ones are in `DARK_RULES`. */
export const INK = '#16241d';
export const SOFT = '#4a5a51';
export const PAPER = '#fdfdf9';
export const MIST = '#f2f5f0';
export const RULE = '#d5ddd3';
export const EDGE = '#6f7a72';
export const DAMSON = '#6d2160';

const CARDS = ['#f7ecae', '#ded6f0', '#f6d3d6', '#cfe0c9', '#cfe3f2', '#ecdcc3', '#c5e6da'] as const;

/** A stop's pasteboard colour; it keeps its daylight in the evening. */
export const cardOf = (stopNumber: number): string => CARDS[(stopNumber - 1) % CARDS.length] ?? CARDS[0];

export const HEADING = "Besley,Rockwell,'Roboto Slab',Georgia,serif";
export const TEXT = "'Atkinson Hyperlegible Next',Verdana,Arial,sans-serif";
export const MONO = "'Atkinson Hyperlegible Mono',Consolas,Menlo,monospace";

/** The one style sheet of a letter: narrow phones, and the evening where the mail program asks for it. */
export const STYLE_SHEET = `:root{color-scheme:light dark;supported-color-schemes:light dark}
@media (max-width:480px){.pad{padding:22px 18px 22px!important}.h1{font-size:38px!important}.tt,.td{width:56px!important;font-size:17px!important;letter-spacing:-.05em!important}.po{width:42px!important}.jo{padding-left:42px!important}.gn{width:104px!important;font-size:16px!important}.h2{font-size:0!important}}
@media (prefers-color-scheme:dark){
body,.mist{background:#15281f!important}.sheet{background:#0f1f18!important}
.ink{color:#e4ece4!important}.soft{color:#a9b8ae!important}.dam{color:#e3a9d6!important}
.ink-bg{background:#e4ece4!important}.btn{background:#e3a9d6!important}.btn a{color:#0f1f18!important}
.ib{border-bottom-color:#e4ece4!important}.rb{border-bottom-color:#2c4236!important}.rt{border-top-color:#2c4236!important}
.db{border-bottom-color:#e3a9d6!important}.dl{border-left-color:#e3a9d6!important}.el{border-left-color:#7f9186!important}.rl{border-left-color:#2c4236!important}
.pe{border-color:#7f9186!important}
}`;
