/** A sentence a user reads, from the data of an issue. */
export type MessageFunction = (data: Readonly<Record<string, unknown>>) => string;
