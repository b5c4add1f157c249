import { TextField } from '#src/ui/text-field.tsx';

/** A new password: long counts, nothing else is asked of it. */
export const LEAST_PASSWORD = 12;

export function PasswordField({
  value,
  onChange,
  isNew,
}: {
  readonly value: string;
  readonly onChange: (value: string) => void;
  readonly isNew?: boolean;
}) {
  return (
    <TextField
      caption={isNew ? 'New password' : 'Password'}
      type="password"
      autoComplete={isNew ? 'new-password' : 'current-password'}
      required
      minLength={isNew ? LEAST_PASSWORD : undefined}
      maxLength={256}
      value={value}
      hint={isNew ? `At least ${LEAST_PASSWORD} characters; a few words in a row do well.` : undefined}
      onChange={(event) => onChange(event.currentTarget.value)}
    />
  );
}
