/** How long after applying it a cover may be taken back as a whole: long enough to see a slip, short enough that few have read their message. */
export const undoMinutes = 10;
