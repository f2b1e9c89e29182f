import { useState, type ComponentProps } from "react";
import { Checkbox } from "#web/components/checkbox.tsx";
import { TextField } from "#web/components/text-field.tsx";

type PasswordFieldProps = Omit<ComponentProps<typeof TextField>, "type">;

/** A password that may be shown while it is typed, pasted, and filled in by a password keeper. */
export function PasswordField(props: PasswordFieldProps) {
  const [shown, setShown] = useState(false);
  return (
    <div>
      <TextField
        {...props}
        type={shown ? "text" : "password"}
        autoCapitalize="none"
        autoCorrect="off"
        spellCheck={false}
      />
      <Checkbox
        name={`${props.name}-shown`}
        label="Show what is typed"
        checked={shown}
        onChange={(event) => {
          setShown(event.target.checked);
        }}
      />
    </div>
  );
}
