/** The one call of @lhncbc/ucum-lhc that the tests use; the package ships no types. */
declare module "@lhncbc/ucum-lhc" {
  export const UcumLhcUtils: {
    getInstance(): {
      convertUnitTo(
        from: string,
        value: number,
        to: string,
        options?: { molecularWeight?: number },
      ): { status: "succeeded" | "failed" | "error"; toVal: number | null; msg: string[] };
    };
  };
}
