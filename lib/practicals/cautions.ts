/** Said wherever a cut is spoken of: the product never calls one safe. */
export const COMES_FIRST =
  'The machine’s manual, your school’s rules, local codes and a qualified instructor come first.';

/** Said before every list of cautions. */
export const CAUTION_PREFACE = `${COMES_FIRST} These are the usual cautions, not a lesson.`;

/** Common practice in school shops; the figures are each school's own to set. */
export const CAUTIONS: readonly string[] = [
  'Work only on machines you have been checked out on, with the instructor in the room.',
  'Wear eye protection, tie back hair and sleeves, and take off rings and gloves at a machine.',
  'Keep guards, splitter and anti-kickback device in place. Blade changes and set-ups are the instructor’s.',
  'Pieces this short are not for jointer or planer: machine the long blank first, then crosscut.',
  'Use a push stick for narrow rips, and never use the rip fence as a length stop for a crosscut.',
  'Keep hands outside the marked zone. A piece too short to hold goes to the sled with a hold-down.',
  'Let the blade stop before you reach for a piece or an offcut.',
];
