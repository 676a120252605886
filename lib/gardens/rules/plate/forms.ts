import type { FlowerForm, PlantForm, TreeForm } from './block';
import { FLOWERS } from './flowers';
import { MAT_NAMES, type MatName } from './mats';
import { TREES } from './trees';

/** A plant from a garden's list, as far as the cutter cares. */
export type ListedPlant = { readonly key: string; readonly drawing: string; readonly heightMm: number };

/** Words in a plant's key, and the form it is cut as. The first that fits decides, so low creepers come before tall cousins. */
const FORMS: readonly (readonly [RegExp, PlantForm])[] = [
  [/thyme|chamomile|baby-tears|mazus/, 'thyme'],
  [/sedum|stonecrop/, 'sedum'],
  [/moss|pearlwort/, 'moss'],
  [/star-creeper|creeper|saxifrage|phlox|aubrieta|campanula|bellflower|alyssum|speedwell|gypsophila|rockfoil/, 'star'],
  [/spruce|fir|cedar|hemlock|larch|conifer/, 'spruce'],
  [/juniper|cotoneaster/, 'juniper'],
  [/pine|mugo/, 'pine'],
  [/cypress|yew|arborvitae|thuja/, 'cypress'],
  [/apple|cherry|crab|plum|hawthorn|blossom/, 'apple'],
  [/maple|acer|birch|willow|elm|oak|azalea/, 'maple'],
  [/box|hebe|topiary|holly|euonymus|myrtle/, 'topiary'],
  [/rose|potentilla|fuchsia/, 'rose'],
  [/fern|spleenwort|bracken/, 'fern'],
  [/thrift|armeria|scabious|globularia/, 'thrift'],
  [/heather|heath/, 'heather'],
  [/lavender|rosemary|sage|salvia|hyssop|catmint|veronica|speedwell/, 'lavender'],
  [/houseleek|sempervivum|agave/, 'houseleek'],
  [/iris|flag|gladiol/, 'iris'],
  [/grass|sedge|fescue|bamboo|reed|rush/, 'grass'],
  [/allium|chive|onion/, 'allium'],
  [/daffodil|narciss|crocus|tulip|snowdrop|aconite|squill|cyclamen|bulb/, 'daffodil'],
  [/daisy|aster|erigeron|tansy|marigold|pink|dianthus|anemone/, 'daisy'],
  [/lily|hosta|primrose|cowslip/, 'lily'],
];

/** The form in which a plant is cut: by its name, else by the drawing that stands for it, else by its height. */
export function formOf({ key, drawing, heightMm }: ListedPlant): PlantForm {
  const byName = (name: string): PlantForm | undefined => FORMS.find(([words]) => words.test(name))?.[1];
  return byName(key) ?? byName(drawing) ?? (heightMm > 250 ? 'topiary' : heightMm > 60 ? 'daisy' : 'thyme');
}

/** Whether a form is a tree or bush, which may stand behind the line. */
export const isTree = (form: PlantForm): form is TreeForm => Object.hasOwn(TREES, form);
/** Whether a form is a soft plant of some height. */
export const isFlower = (form: PlantForm): form is FlowerForm => Object.hasOwn(FLOWERS, form);
/** Whether a form covers the ground. */
export const isMat = (form: PlantForm): form is MatName => MAT_NAMES.some((name) => name === form);

const HALF_WIDTHS: Record<TreeForm | FlowerForm, (height: number) => number> = {
  spruce: (h) => h * 0.28 + 1, pine: (h) => h * 0.55, cypress: (h) => h * 0.14 + 0.5, apple: (h) => h * 0.5, maple: (h) => h * 0.5, topiary: (h) => h * 0.48,
  rose: (h) => h * 0.42 + 1, juniper: (h) => h * 1.5, fern: (h) => h * 0.9, thrift: () => 8, houseleek: (h) => h * 2.2, iris: (h) => 4 + h * 0.14, grass: () => 9,
  allium: () => 8, daffodil: () => 7, daisy: () => 8, lily: (h) => h * 0.5, heather: () => 8, lavender: () => 8,
};

/** How far a plant reaches to either side of its middle, in centimetres. */
export const halfWidthCm = (form: TreeForm | FlowerForm, heightCm: number): number => HALF_WIDTHS[form](heightCm);
