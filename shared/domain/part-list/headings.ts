import type { PartField } from '#shared/domain/part-list/types.ts';
import { plainMarks } from '#shared/domain/plain-marks.ts';
import type { LengthUnit } from '#shared/domain/units.ts';

/**
 * What a heading can say. `material` holds a section or a grade, its cells decide; `shape` and `size` are
 * the two halves of a section when both stand in the list; `other` is known and of no use to a cut plan.
 */
export type HeadingMeaning = PartField | 'material' | 'shape' | 'size' | 'other';

export type Heading = {
  readonly meaning: HeadingMeaning | null;
  /** 1 the word itself, higher for words that can mean more; the lowest rank wins a field. */
  readonly rank: number;
  readonly unit: LengthUnit | null;
};

/** Spellings by meaning and rank, in the languages the trade writes; accents and punctuation are off. */
const SPELLINGS: readonly (readonly [HeadingMeaning, number, string])[] = [
  [
    'mark',
    1,
    'mark|marks|mk|mk no|mark no|mark nr|mark number|mark #|mark id|piece mark|piecemark|pc mark|pcmk|pcmark|pc mk|part mark|member mark|minor mark|marke|repere|rep|marque|marca|marchio|merk|merkteken',
  ],
  [
    'mark',
    2,
    'part|p n|pn|part no|part nr|part number|part #|part id|partno|piece no|piece nr|piece number|piece id|piece #|piece|pc|pc no|pc #|teil|teil nr|teilenr|teilnr|teilenummer|bauteil|piece repere|pieza|pezzo|onderdeel|detail|detail no|del|czesc',
  ],
  [
    'mark',
    3,
    'item|item no|item nr|item number|item #|item id|pos|pos no|pos nr|posnr|position|position no|position nr|positionsnummer|posicion|posizione|positie|poz',
  ],
  ['mark', 4, 'ref|reference|id|tag|tag no|element|component'],
  [
    'quantity',
    1,
    "qty|quantity|quantities|quant|qnty|qnt|q'ty|qty req'd|qty reqd|qty required|required qty|quantity required|order qty|qty each|count|piece count|pc count|stk|stuck|stueck|stuckzahl|stueckzahl|anzahl|anz|menge|stk zahl|nombre|nbre|nb|qte|quantite|cantidad|cant|quantita|q ta|aantal|antal|ilosc|pocet|kpl|maara",
  ],
  [
    'quantity',
    2,
    "qty total|total qty|total quantity|pcs|pieces|pces|no off|no of|no of pieces|no of pcs|no pcs|no req'd|no reqd|no required|number off|number of|number of pieces|num|req'd|reqd|required|req|off|ea|each|units|parts",
  ],
  ['quantity', 3, 'no|nos|nr|number|#|x'],
  [
    'section',
    1,
    "section|sections|sect|section size|profile|profil|profiles|profile size|designation|bezeichnung|querschnitt|abmessung|abmessungen|profilo|perfil|profiel|seccion|sezione|material size|mat size|matl size|mat'l size|material section|bar size|stock size|member size|size and shape|shape and size|shape size|material description|material desc",
  ],
  ['section', 2, 'member|stock|raw material|raw stock|halbzeug|dimensions section'],
  [
    'section',
    3,
    'description|desc|descr|item description|part description|benennung|designacion|descripcion|descrizione|omschrijving',
  ],
  [
    'size',
    1,
    'size|sizes|dimension|dimensions|dim|dims|grosse|groesse|taille|dimensiones|dimensioni|afmeting|maat',
  ],
  [
    'shape',
    1,
    'shape|type|section type|kind|family|form|profile type|prof type|member type|material type|mat type|shp',
  ],
  [
    'grade',
    1,
    "grade|grades|gr|material grade|mat grade|matl grade|mat'l grade|steel grade|steel|quality|material quality|qualitat|gute|stahlsorte|stahlgute|nuance|acier|calidad|acero|qualita|kwaliteit|astm|spec|specification|material spec|mat spec|matl spec|mat'l spec|steel spec|astm spec|werkstoffnr|staalsoort|gatunek|jakost",
  ],
  ['material', 1, "material|mat|matl|mat'l|mtl|mat l|werkstoff|matiere|materiau|materiaal|materiale|stoff"],
  [
    'length',
    1,
    'length|lengths|len|lgth|lngth|lgt|lg|lng|cut length|cut len|cut lg|cutting length|overall length|oal|oa length|o a length|piece length|pc length|part length|finished length|finish length|net length|long|lange|laenge|schnittlange|zuschnittlange|longueur|longueur coupe|longitud|largo|lunghezza|lengte|langd|laengde|dlugosc|delka|length each|length ea|len ea|length per piece|length feet inches|length ft in|length ft-in|length feet and inches|length fractional',
  ],
  ['length', 2, 'cut size|cut to'],
  ['length', 3, 'l|cut'],
  ['feet', 1, "ft|feet|foot|'"],
  ['inches', 1, 'in|inch|inches|ins|"|inches and fractions|in and fractions'],
  ['width', 1, 'width|wid|wd|plate width|breite|largeur|ancho|larghezza|breedte|bredd|szerokosc'],
  ['width', 3, 'w|b'],
  [
    'note',
    1,
    'note|notes|remark|remarks|comment|comments|bemerkung|bemerkungen|anmerkung|hinweis|remarque|remarques|observaciones|observations|nota|notas|opmerking|uwagi',
  ],
  [
    'finish',
    1,
    'finish|coating|surface|surface finish|treatment|paint|galv|galvanized|oberflache|finition|acabado|finitura|afwerking',
  ],
  [
    'heat',
    1,
    'heat|heat no|heat nr|heat number|heat #|heat num|charge|chargennummer|schmelze|coulee|colada|colata',
  ],
  [
    'neededBy',
    1,
    "needed by|need by|needed|date needed|need date|due|due date|date due|date req'd|date reqd|date required|required by|required date|req date|delivery|delivery date|termin|liefertermin|ship date|on site",
  ],
  [
    'other',
    1,
    'weight|wt|weight lbs|weight kg|total weight|total wt|unit weight|weight each|wt each|lbs|kg|mass|total mass|unit mass|gewicht|poids|peso|area|surface area|assembly|assembly mark|assembly no|asm|assy|main mark|ship mark|sequence|seq|seq no|phase|lot|zone|drawing|drawing no|dwg|dwg no|sheet|rev|revision|job|job no|project|line|line no|row|total length|total len|total lg|gesamtlange|stock length|price|cost|unit price|page|holes|thickness|thk|dicke|operations|operation|cnc|status|route|location',
  ],
];

const BY_SPELLING = new Map(
  SPELLINGS.flatMap(([meaning, rank, spellings]) =>
    spellings.split('|').map((spelling) => [spelling, { meaning, rank }] as const),
  ),
);

/** Words that make a longer heading likely; a person still looks. Rank 5 and up is never sure. */
const LIKELY: readonly (readonly [HeadingMeaning, RegExp])[] = [
  ['other', /\b(?:weight|mass|total|gewicht|stock length|assembly|price)\b/],
  ['quantity', /\b(?:qty|quantity|anzahl|stuck|count)\b/],
  ['mark', /\b(?:mark|piece mark)\b/],
  ['length', /\b(?:length|lange|longueur|longitud|lunghezza)\b/],
  ['width', /\b(?:width|breite|largeur)\b/],
  ['grade', /\b(?:grade|steel|spec)\b/],
  ['section', /\b(?:section|profile|profil)\b/],
  ['note', /\b(?:notes?|remarks?|comments?)\b/],
  ['neededBy', /\b(?:due|needed|required by)\b/],
];
export const LEAST_UNSURE_RANK = 3;

const UNIT_WORDS: Readonly<Record<string, LengthUnit>> = {
  mm: 'mm',
  millimeter: 'mm',
  millimetre: 'mm',
  millimeters: 'mm',
  millimetres: 'mm',
  cm: 'cm',
  m: 'm',
  meter: 'm',
  metre: 'm',
  meters: 'm',
  metres: 'm',
  in: 'in',
  ins: 'in',
  inch: 'in',
  inches: 'in',
  '"': 'in',
  ft: 'ft',
  feet: 'ft',
  foot: 'ft',
  "'": 'ft',
  'ft-in': 'in',
  'ft in': 'in',
  'ft & in': 'in',
  '\'-"': 'in',
  'feet inches': 'in',
  'feet-inches': 'in',
  'feet and inches': 'in',
};

/** The unit a word of a heading or of a units row names, or null: `mm`, `(inches)`, `[ft-in]`. */
export function readUnitWord(text: string): LengthUnit | null {
  const word = plainMarks(text)
    .replace(/^[[({]|[\])}.]+$/g, '')
    .replace(/\.(?= |$)/g, '')
    .trim();
  return UNIT_WORDS[word] ?? null;
}

function plainHeading(text: string): string {
  return plainMarks(text)
    .normalize('NFD')
    .replace(/[\u0300-\u036f]/g, '')
    .replaceAll('ß', 'ss')
    .replace(/n[°º]/g, 'no ')
    .replace(/[._:;,!?*/\\()[\]{}]+/g, ' ')
    .replace(/(^|\w )-|-(?= |$)/g, '$1')
    .replace(/\s+/g, ' ')
    .trim();
}

function look(words: string): { meaning: HeadingMeaning; rank: number } | null {
  return BY_SPELLING.get(words) ?? BY_SPELLING.get(words.replaceAll('-', ' ')) ?? null;
}

/** `Length (mm)` → the words before the bracket and the unit in it; `Length mm`, `Len_in`, `Length, ft` too. */
function splitUnit(text: string): { words: string; unit: LengthUnit | null } {
  const bracket = /^(.*?)[[({]([^\])}]*)[\])}]\s*$/.exec(text);
  const inBracket = bracket ? readUnitWord(bracket[2] ?? '') : null;
  if (bracket && inBracket) return { words: plainHeading(bracket[1] ?? ''), unit: inBracket };
  const words = plainHeading(text);
  const last = /^(.+?)[ -](\S+|ft-in|ft in)$/.exec(words);
  const unit = last ? readUnitWord(last[2] ?? '') : null;
  return last?.[1] && unit ? { words: last[1], unit } : { words, unit: null };
}

/** What one heading says: the column's meaning, how far it can be trusted, and the unit it names. */
export function readHeading(text: string): Heading {
  const whole = look(plainHeading(text));
  const { words, unit } = splitUnit(text);
  const bare = look(words);
  // `Length (in)` is inches only beside a `Length (ft)`; alone it is a length. Columns decide.
  if (bare && unit && ['length', 'width', 'size', 'other'].includes(bare.meaning)) return { ...bare, unit };
  if (whole) return { ...whole, unit };
  if (bare) return { ...bare, unit };
  const tokens = words.replaceAll('-', ' ');
  const likely = /\d{3}/.test(tokens) ? undefined : LIKELY.find(([, pattern]) => pattern.test(tokens));
  return likely ? { meaning: likely[0], rank: 5, unit } : { meaning: null, rank: 9, unit: null };
}
