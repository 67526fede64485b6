/** Every kind of disposition, one line each. */
export { oneCompartment } from "./oneCompartment.ts";
export { saturable } from "./saturable.ts";
export { twoCompartment } from "./twoCompartment.ts";
