/** `taught` = 1 − posterior sd / prior sd. From here the levels taught much: the spread is halved. Our own wording, no published limit. */
export const TAUGHT_MUCH = 0.5;
/** Below it the levels taught little: more than four fifths of the spread is left. Our own wording, no published limit. */
export const TAUGHT_LITTLE = 0.2;
