import { Link } from 'react-router-dom';
import type { LinkProps } from 'react-router-dom';

/** A link within running text or a table. */
export function TextLink(props: Omit<LinkProps, 'className' | 'style'>) {
  return <Link {...props} className="link" />;
}
