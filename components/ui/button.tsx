import type { ComponentProps } from 'react';
import { type ActionVariant, actionStyle } from './action-style';

interface ButtonProps extends ComponentProps<'button'> {
  variant?: ActionVariant;
}

/** An action in words. At most one `primary` on a page. */
export function Button({ variant, className, type = 'button', ...rest }: ButtonProps) {
  return <button {...rest} type={type} className={actionStyle(variant, className)} />;
}
