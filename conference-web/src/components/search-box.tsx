import { useEffect, useRef, useState } from 'react';
import { useSearchKey } from './keys/use-key';
import styles from './field.module.css';

const PAUSE_MS = 300;

interface SearchBoxProps {
  label: string;
  value: string;
  onSearch: (text: string) => void;
}

/** A search field that `/` reaches; it asks once the typing rests. */
export function SearchBox({ label, value, onSearch }: SearchBoxProps) {
  const field = useRef<HTMLInputElement>(null);
  useSearchKey(field);
  const [text, setText] = useState(value);
  const [lastValue, setLastValue] = useState(value);
  // going back in the history changes the field too, but never what is being typed
  if (value !== lastValue) {
    setLastValue(value);
    if (value !== text.trim()) setText(value);
  }
  useEffect(() => {
    if (text.trim() === value) return;
    const timer = setTimeout(() => onSearch(text.trim()), PAUSE_MS);
    return () => clearTimeout(timer);
  }, [text, value, onSearch]);
  return (
    <label className={styles.search}>
      {label}
      <input ref={field} type="search" maxLength={200} className={styles.input} value={text} onChange={(event) => setText(event.target.value)} />
    </label>
  );
}
