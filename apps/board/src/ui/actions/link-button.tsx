import { Link, type LinkProps } from 'react-router-dom';
import { buttonClass, type ButtonLook, type ButtonSize } from './button-look.ts';

interface LinkButtonProps extends Omit<LinkProps, 'className' | 'style'> {
  readonly look?: ButtonLook;
  readonly size?: ButtonSize;
}

/** A link that leads to another screen and looks like a button. */
export function LinkButton({ look = 'plain', size = 'mouse', ...link }: LinkButtonProps) {
  return <Link {...link} className={buttonClass({ look, size })} />;
}
