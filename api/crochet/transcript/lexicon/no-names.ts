const words = (text: string): ReadonlySet<string> => new Set(text.trim().split(/\s+/));

/** Colours and materials: they may stand before the name of a part, and are never one. */
export const SHADES = words(`
  red orange yellow green blue purple violet pink brown black white grey gray cream beige tan gold golden silver teal
  navy mustard rust maroon wheat oatmeal natural contrast dark light pale bright main second first other same new next
  cotton wool woollen acrylic yarn thread felt chunky soft tiny small wee bigger smaller simple easy basic cute sweet plain
  quick whole single old very actual rest`);

/** Nouns and verbs that are heard where parts are named and are no part: measures, tools, steps, moments, talk. */
export const NO_PART = words(`
  millimetre millimetres millimeter millimeters centimetre centimetres centimeter centimeters inch inches metre metres
  yard yards gram grams ounce ounces ball balls skein skeins minute minutes hour hours second seconds day days week
  time times while moment morning evening night year video videos tutorial clip recording camera pattern project
  hook hooks needle needles scissors marker markers stuffing filling fluff polyfill eyes button buttons ribbon wire
  colour color colours colors size sizes gauge tension weight strand strands knot slip loop end ends tail-end
  stitch stitches round rounds row rows chain chains ring number numbers count increase decrease increases decreases
  beginning start middle centre center finish side sides right wrong front back top bottom outside inside way thing
  things bit bits part parts piece pieces one ones two pair set lot lots rest hand hands finger fingers work fabric
  assembly sewing seam seams edge lovely friends everyone everybody folks people hello welcome going working making
  start starting begin beginning stuff stuffed sew sewn fasten fastened cut pull turn look see hold keep leave put take
  get let know think want need show make made help idea question question mistake mistakes secret trick tip tips
  nothing something anything everything everyone somebody everybody what that this these those here there now then
  again please sorry okay thanks magic adjustable total clock kettle tea coffee cup bus lunch break note rule reason
  matter case point place face-up little less more most same bad good fine fun hard best fact question term terms
  american british english spiral space spaces corner corners gap counter video's sure ready able all both any each
  safety child children kid baby yourself myself him her it them me us you they fasten conventions come comes listen
  shaping left closing opening joining cast story brag list materials home bed dog cat cats door house rain sun weather`);

/** Plurals that are not made with an s alone. */
export const SINGULARS: ReadonlyMap<string, string> = new Map([
  ['leaves', 'leaf'],
  ['feet', 'foot'],
  ['teeth', 'tooth'],
  ['halves', 'half'],
  ['calyces', 'calyx'],
  ['antennae', 'antenna'],
]);
