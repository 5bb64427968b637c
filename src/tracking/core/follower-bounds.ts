/** Bounds of following one point, set on rendered clips of known truth; no other source. */

export const LEVELS = 4;
/** The level on which a lost point is looked for. */
export const SEARCH_LEVEL = 2;
export const SEARCH_RADIUS = 8;
/** Half the side of what is looked at about a point, pixels. */
export const REACH = 128;
/** How far refining may move what stepping found, pixels. */
export const REFINE_REACH = 7;
/** How far it may lie from where its velocity brings it, to be just as expected, pixels. */
export const EXPECTED = 5;
/** Below this likeness other ways of finding the point are tried. */
export const DOUBTFUL = 0.8;
/** A lost point is believed to be back from this likeness on … */
export const BACK = 0.86;
/** … if nothing else nearby is nearly as much like it. */
export const DISTINCT = 0.06;

/** What is found again within this of where it is expected is most likely the same, pixels. */
export const NEAR = 6;
/** Forth and back again within this, the step itself can be believed, pixels. */
export const RETURNED = 2;
/** As near as this to where its velocity brings it, likeness alone tells: the way back may go astray in a smear, pixels. */
export const FORESEEN = 2;
/** Where it was placed it is looked for this far, pixels of the level that is searched. */
export const HOME_REACH = 6;
/** A lost point is looked for along its way for so many pictures. */
export const ON_ITS_WAY = 4;
/** Half of that already is a jerk, unless the point looks exactly as it did. */
export const JERK = 0.5;
/** What is found elsewhere may be another dot that looks the same: a person has to look at it. */
export const FOUND_AGAIN = 0.4;
/** So sure is what was lost or torn and seems to be back, until it has proved itself. */
export const UNPROVED = 0.45;
/** A mark that would slide along an edge is never surer than this, below what is called sure. */
export const ALONG_AN_EDGE = 0.45;
