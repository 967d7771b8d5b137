import { Button } from 'antd';
import type { ButtonProps } from 'antd';
import { useHref, useNavigate } from 'react-router-dom';
import type { MouseEvent } from 'react';

/** A link that looks like a button: one element, opened in place by a plain click and as any link otherwise. */
export function LinkButton({ to, state, ...rest }: Omit<ButtonProps, 'href' | 'onClick'> & { to: string; state?: unknown }) {
  const navigate = useNavigate();
  const href = useHref(to);
  const go = (event: MouseEvent) => {
    if (event.button !== 0 || event.metaKey || event.ctrlKey || event.shiftKey || event.altKey) return;
    event.preventDefault();
    void navigate(to, { state });
  };
  return <Button {...rest} href={href} onClick={go} />;
}
