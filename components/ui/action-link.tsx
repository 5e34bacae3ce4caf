import Link from 'next/link';
import type { ComponentProps } from 'react';
import { type ActionVariant, actionStyle } from './action-style';

type ActionLinkProps = ComponentProps<typeof Link> & { variant?: ActionVariant };

/** A link that is an action: looks like a button of the same variant, leads to a page. */
export function ActionLink({ variant, className, ...rest }: ActionLinkProps) {
  return <Link {...rest} className={actionStyle(variant, className)} />;
}
