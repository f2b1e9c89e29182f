import { useMemo, type ReactNode } from "react";
import { useLocation } from "react-router-dom";
import { searchToBuild } from "#shared/catalogue/build-address.ts";
import type { CurrentCatalogue } from "#shared/contracts/catalogue.ts";
import { BuildDeskProvider } from "./build-desk.tsx";
import { SpecTrouble } from "./spec-trouble.tsx";

interface BuildGateProps {
  current: CurrentCatalogue;
  children: ReactNode;
}

/** Lets a build in whose address can be read; otherwise says what is wrong with its spec code, and the ways on. */
export function BuildGate({ current, children }: BuildGateProps) {
  const { search } = useLocation();
  const trouble = useMemo(
    () => searchToBuild(current.catalogue, new URLSearchParams(search)).spec,
    [current, search],
  );
  if (trouble !== null)
    return <SpecTrouble key={search} current={current} trouble={trouble} search={search} />;
  return <BuildDeskProvider current={current}>{children}</BuildDeskProvider>;
}
