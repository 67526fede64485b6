import { useEffect } from "react";
import { BenchScreen } from "./bench/BenchScreen.tsx";
import { CasesScreen } from "./cases/CasesScreen.tsx";
import { MedicinesScreen } from "./medicines/MedicinesScreen.tsx";
import { SettingsScreen } from "./settings/SettingsScreen.tsx";
import "./style/base.css";
import { NoticeStack } from "./NoticeStack.tsx";
import { SummaryScreen } from "./summary/SummaryScreen.tsx";
import { UpdateBar } from "./UpdateBar.tsx";
import { useWorkbench } from "./useWorkbench.ts";

/** The whole of what is on screen: one screen at a time, notices over it. */
export function Workbench() {
  const screen = useWorkbench((state) => state.screen);
  const open = useWorkbench((state) => state.open);
  const show = useWorkbench((state) => state.show);
  const label = open?.value.label ?? "";
  useEffect(() => {
    document.title = label ? `${label} · Ebbline` : "Ebbline";
  }, [label]);
  return (
    <>
      <UpdateBar />
      {screen === "bench" && open ? (
        <BenchScreen onPrint={() => show("summary")} />
      ) : screen === "summary" && open ? (
        <SummaryScreen />
      ) : screen === "medicines" ? (
        <MedicinesScreen />
      ) : screen === "settings" ? (
        <SettingsScreen />
      ) : (
        <CasesScreen />
      )}
      <NoticeStack />
    </>
  );
}
