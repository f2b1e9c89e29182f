import { useEffect, useState } from "react";

const pause = 400;

/** A value once it has stood for a moment, so that nothing is asked at every key. Compared by its JSON text. */
export function useSettled<T>(value: T): T {
  const text = JSON.stringify(value);
  const [settled, setSettled] = useState({ text, value });
  useEffect(() => {
    if (text === settled.text) return;
    const timer = setTimeout(() => {
      setSettled({ text, value });
    }, pause);
    return () => {
      clearTimeout(timer);
    };
  }, [text, value, settled.text]);
  return settled.value;
}
