import { Link, type LinkProps } from 'react-router-dom';
import { buttonClass, type ButtonLook } from './button.tsx';

/** A link that looks like a button: it goes somewhere, it does nothing. */
export function ButtonLink({ look, className, ...rest }: LinkProps & { look?: ButtonLook }) {
  return <Link {...rest} className={buttonClass(look, className)} />;
}
