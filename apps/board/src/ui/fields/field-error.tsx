import { AlertIcon } from '../icons.tsx';

interface FieldErrorProps {
  readonly id?: string | undefined;
  readonly message: string | undefined;
}

export function FieldError({ id, message }: FieldErrorProps) {
  if (message === undefined || message === '') return null;
  return (
    <p id={id} className="text-label text-madder m-0 flex items-start gap-1.5">
      <AlertIcon size={14} />
      <span>{message}</span>
    </p>
  );
}
