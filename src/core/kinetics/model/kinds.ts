/** Every kind of disposition, one line each. */
export { oneCompartment } from "./oneCompartment.ts";
export { twoCompartment } from "./twoCompartment.ts";
