import type { ReactNode } from "react";
import { Redo2, Undo2 } from "lucide-react";
import { Button } from "#web/components/button.tsx";
import { useBuildDesk } from "./build-desk.tsx";

/** Undo and redo of options; they keep their place while there is nothing to undo. */
export function UndoButtons() {
  const { undo, redo } = useBuildDesk();
  return (
    <>
      <Turn label="Undo" keys="Control+Z" act={undo} icon={<Undo2 className="size-4" aria-hidden="true" />} />
      <Turn
        label="Redo"
        keys="Control+Shift+Z"
        act={redo}
        icon={<Redo2 className="size-4" aria-hidden="true" />}
      />
    </>
  );
}

interface TurnProps {
  label: string;
  keys: string;
  act: (() => void) | null;
  icon: ReactNode;
}

function Turn({ label, keys, act, icon }: TurnProps) {
  return (
    <Button
      icon={icon}
      aria-disabled={act === null}
      aria-keyshortcuts={keys}
      title={keys.replaceAll("Control", "Ctrl")}
      onClick={() => act?.()}
      className="max-sm:px-3 aria-disabled:border-rule aria-disabled:text-iron"
    >
      <span className="max-sm:sr-only">{label}</span>
    </Button>
  );
}
