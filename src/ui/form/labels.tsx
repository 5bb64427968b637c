import { createContext, useContext, useEffect, useState, type ReactNode } from 'react';

/** What each field of a form is called, so that the summary can name it. */
const LabelsContext = createContext<Map<string, ReactNode>>(new Map());

export function LabelsProvider({ children }: { children: ReactNode }) {
  const [labels] = useState(() => new Map<string, ReactNode>());
  return <LabelsContext value={labels}>{children}</LabelsContext>;
}

/** `null` leaves the field unnamed: its fault then stands in the summary by itself. */
export function useLabel(name: string, label: ReactNode): void {
  const labels = useContext(LabelsContext);
  useEffect(() => {
    if (label === null) return;
    labels.set(name, label);
    return () => void labels.delete(name);
  }, [labels, name, label]);
}

export const useLabels = () => useContext(LabelsContext);
