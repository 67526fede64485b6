import { mergeConfig } from "vite";
import first from "../../../vite.config.ts";

/** The same program with one mark in its page: a new version, as a later release would be. */
export default mergeConfig(first, {
  plugins: [
    {
      name: "second-build",
      transformIndexHtml: () => [{ tag: "meta", attrs: { name: "second-build" }, injectTo: "head" }],
    },
  ],
});
