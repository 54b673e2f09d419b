import { useEffect, useRef, useState } from 'react';
import { InputField } from '#client/ui/field.tsx';

const stillForMs = 300;

interface SearchBoxProps {
  label: string;
  placeholder: string;
  maxLength: number;
  value: string;
  onChange: (text: string) => void;
}

/** Free text: the search follows once the typing rests. */
export function SearchBox({ label, placeholder, maxLength, value, onChange }: SearchBoxProps) {
  const [typed, setTyped] = useState(value);
  /** What was last handed on, to tell our own change of the address from one made elsewhere (Back, a cleared filter). */
  const sent = useRef(value);
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined);

  useEffect(() => {
    if (value === sent.current) return;
    sent.current = value;
    setTyped(value);
  }, [value]);
  useEffect(() => () => clearTimeout(timer.current), []);

  function send(text: string) {
    clearTimeout(timer.current);
    if (text.trim() === sent.current) return;
    sent.current = text.trim();
    onChange(text.trim());
  }

  return (
    <form
      role="search"
      className="w-[25rem] max-w-full"
      onSubmit={(event) => {
        event.preventDefault();
        send(typed);
      }}
    >
      <InputField
        label={label}
        hideLabel
        type="search"
        autoComplete="off"
        maxLength={maxLength}
        placeholder={placeholder}
        value={typed}
        onChange={(event) => {
          const text = event.target.value;
          setTyped(text);
          clearTimeout(timer.current);
          timer.current = setTimeout(() => send(text), stillForMs);
        }}
      />
    </form>
  );
}
