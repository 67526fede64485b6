// Writes what is made from the code and committed: the JSON Schemas and the pages of the medicine records in docs, and the records
// inside the demo cases.
// Run it after a change of a schema or a record: node .ci/schema.mjs
import { mkdirSync, readdirSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { fileURLToPath } from "node:url";
import { runnerImport } from "vite";

const root = fileURLToPath(new URL("../", import.meta.url));
/** @param {string} path */
const load = async (path) =>
  (await runnerImport(`${root}${path}`, { root, configFile: false, logLevel: "error" })).module;

const { FILE_SCHEMAS, fileSchemaPrint } = await load("src/core/case/fileSchemas.ts");
for (const { file, make } of FILE_SCHEMAS) {
  writeFileSync(`${root}${file}`, fileSchemaPrint(make()));
  console.log(`wrote ${file}`);
}

const { medicinePages } = await load(".ci/medicinePages.ts");
/** @type {ReadonlyMap<string, string>} */
const pages = medicinePages();
mkdirSync(`${root}docs/medicines`, { recursive: true });
for (const [file, text] of pages) {
  writeFileSync(`${root}${file}`, text);
  console.log(`wrote ${file}`);
}
for (const name of readdirSync(`${root}docs/medicines`)) {
  if (!pages.has(`docs/medicines/${name}`)) rmSync(`${root}docs/medicines/${name}`);
}

const { caseValidate, casePrint } = await load("src/core/case/index.ts");
const { recordById } = await load("src/core/medicine/index.ts");
for (const name of readdirSync(`${root}demo-data`).filter((each) => each.endsWith(".ebbline.json"))) {
  const file = `${root}demo-data/${name}`;
  const value = JSON.parse(readFileSync(file, "utf8"));
  const renewed = caseValidate({ ...value, medicine: recordById(value.medicine.id) });
  if (!renewed.ok) throw new Error(`${name} does not fit its record: ${JSON.stringify(renewed.issues)}`);
  writeFileSync(file, casePrint(renewed.value));
  console.log(`wrote demo-data/${name}`);
}
