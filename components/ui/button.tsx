import type { ComponentProps, ReactNode } from 'react';
import { buttonLook, type ButtonSize, type ButtonTone } from './button-look';

type ButtonProps = Omit<ComponentProps<'button'>, 'className' | 'children'> & {
  tone?: ButtonTone;
  size?: ButtonSize;
  children: ReactNode;
};

/** Says what will happen ("Keep 3 places at 11:30"). One `main` a page; `bare` looks like a link but acts. */
export function Button({ tone = 'plain', size = 'usual', type = 'button', ...rest }: ButtonProps) {
  return <button type={type} className={buttonLook(tone, size)} {...rest} />;
}
