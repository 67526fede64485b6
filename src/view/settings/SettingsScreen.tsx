import type { ReactNode } from "react";
import { version } from "../../../package.json";
import { ENGINE } from "../../core/analysis/index.ts";
import { INTENDED_USE, placeWords, settingsWords } from "../../core/messages/index.ts";
import { Button } from "../ui/Button.tsx";
import { RadioField } from "../ui/RadioField.tsx";
import { ScreenHead } from "../ui/ScreenHead.tsx";
import { screenPlaces } from "../ui/screenPlaces.ts";
import { TextField } from "../ui/TextField.tsx";
import { useWorkbench } from "../useWorkbench.ts";
import { usePersistence } from "./usePersistence.ts";
import "./SettingsScreen.css";

export function SettingsScreen() {
  const settings = useWorkbench((state) => state.settings);
  const changeSettings = useWorkbench((state) => state.changeSettings);
  const boot = useWorkbench((state) => state.boot);
  const entries = useWorkbench((state) => state.entries);
  const show = useWorkbench((state) => state.show);
  const hasOpenCase = useWorkbench((state) => state.open !== null);
  const persistence = usePersistence();
  const isOffline = "serviceWorker" in navigator && navigator.serviceWorker.controller !== null;
  return (
    <>
      <ScreenHead places={screenPlaces("settings", show, hasOpenCase)} />
      <main className="settings-screen">
        <h1>{placeWords.settings}</h1>
        <section aria-labelledby="settings-print">
          <h2 id="settings-print">{settingsWords.print}</h2>
          <div className="settings-screen-fields">
            <RadioField
              label={settingsWords.pageSize}
              value={settings.pageSize}
              choices={[
                { value: "A4", label: "A4" },
                { value: "Letter", label: "Letter" },
              ]}
              onChoose={(pageSize) => void changeSettings({ pageSize })}
            />
            <RadioField
              label={settingsWords.microgram}
              value={settings.microgram}
              choices={[
                { value: "microgram", label: "microgram" },
                { value: "mcg", label: "mcg" },
              ]}
              description={settingsWords.microgramHelp}
              onChoose={(microgram) => void changeSettings({ microgram })}
            />
            <TextField
              label={settingsWords.preparedBy}
              value={settings.preparedBy}
              maxLength={120}
              description={settingsWords.preparedByHelp}
              onCommit={(preparedBy) => void changeSettings({ preparedBy: preparedBy.trim() })}
            />
          </div>
        </section>
        <section aria-labelledby="settings-keeping">
          <h2 id="settings-keeping">{settingsWords.keeping}</h2>
          <p>{settingsWords.keepingText}</p>
          <dl className="settings-screen-facts">
            <Fact name={settingsWords.storage}>{settingsWords.storageState[boot.kind]}</Fact>
            <Fact name={settingsWords.casesStored}>{entries.length}</Fact>
            <Fact name={settingsWords.persisted}>
              {settingsWords.persistedState[persistence.state]}
              {persistence.state === "not given" ? (
                <>
                  {" "}
                  <Button kind="quiet" onPress={() => void persistence.ask()}>
                    {settingsWords.persistAsk}
                  </Button>
                </>
              ) : null}
            </Fact>
          </dl>
          <h3>{settingsWords.backupTitle}</h3>
          <p>{settingsWords.backup}</p>
        </section>
        <section aria-labelledby="settings-program">
          <h2 id="settings-program">{settingsWords.program}</h2>
          <dl className="settings-screen-facts">
            <Fact name={settingsWords.version}>Ebbline {version}</Fact>
            <Fact name={settingsWords.engine}>{ENGINE}</Fact>
            <Fact name={settingsWords.offline}>{isOffline ? settingsWords.offlineYes : settingsWords.offlineNo}</Fact>
          </dl>
          <p className="settings-screen-use">{INTENDED_USE}</p>
        </section>
      </main>
    </>
  );
}

function Fact({ name, children }: { readonly name: string; readonly children: ReactNode }) {
  return (
    <div>
      <dt>{name}</dt>
      <dd>{children}</dd>
    </div>
  );
}
