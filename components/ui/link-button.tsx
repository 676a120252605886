import Link from 'next/link';
import type { ComponentProps } from 'react';
import { buttonLook, type ButtonSize, type ButtonTone } from './button-look';

type LinkButtonProps = Omit<ComponentProps<typeof Link>, 'className'> & { tone?: ButtonTone; size?: ButtonSize };

/** Goes somewhere and weighs as much as a button. */
export function LinkButton({ tone = 'plain', size = 'usual', ...rest }: LinkButtonProps) {
  return <Link className={buttonLook(tone, size)} {...rest} />;
}
