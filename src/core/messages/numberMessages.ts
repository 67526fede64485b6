import type { MessageFunction } from "./index.ts";

export const numberMessages: Readonly<Record<string, MessageFunction>> = {};
