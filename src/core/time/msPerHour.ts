export const MS_PER_HOUR = 3_600_000;
