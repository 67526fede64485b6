// Writes what is made from the code and committed: the JSON Schemas in docs, and the medicine records inside the demo cases.
// Run it after a change of a schema or a record: node .ci/schema.mjs
import { readdirSync, readFileSync, writeFileSync } from "node:fs";
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
