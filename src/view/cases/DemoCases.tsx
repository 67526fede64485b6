import { casesWords } from "../../core/messages/index.ts";
import type { DemoEntry } from "../../shell/store/workbenchState.ts";
import { Button } from "../ui/Button.tsx";

export interface DemoCasesProps {
  readonly demos: readonly DemoEntry[];
  readonly onOpen: (name: string) => void;
}

export function DemoCases({ demos, onOpen }: DemoCasesProps) {
  return (
    <ul className="demo-cases">
      {demos.map((demo) => (
        <li key={demo.name} className="demo-cases-one">
          <p>
            <strong>{demo.label}</strong> <span className="cases-screen-demo">{casesWords.demoMark}</span>
            <span className="demo-cases-about">
              {demo.medicine}. {demo.about}
            </span>
          </p>
          <Button onPress={() => onOpen(demo.name)} name={`${casesWords.openDemo} ${demo.label}`}>
            {casesWords.openDemo}
          </Button>
        </li>
      ))}
    </ul>
  );
}
