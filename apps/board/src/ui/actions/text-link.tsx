import { Link, type LinkProps } from 'react-router-dom';

/** A link in running text. */
export function TextLink(props: Omit<LinkProps, 'className' | 'style'>) {
  return <Link {...props} className="text-indigo hover:text-indigo-deep underline underline-offset-3" />;
}
