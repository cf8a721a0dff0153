import { useEffect, useRef } from 'react';
import { announce } from '../ui/announcer.tsx';
import { Notice } from '../ui/notice.tsx';
import type { NoticeProps } from '../ui/notice.tsx';

/**
 * How something that a person began has ended. The keyboard and a screen reader go on here, because the button that began it rests or is
 * gone; what was announced while it was under way is taken back.
 */
export function Outcome({ title, children, ...rest }: Omit<NoticeProps, 'urgent' | 'title'> & { readonly title: string }) {
  const place = useRef<HTMLDivElement>(null);
  useEffect(() => {
    place.current?.focus();
    announce('');
  }, []);
  return (
    <div ref={place} tabIndex={-1} role="group" aria-label={title} className="outline-none">
      <Notice {...rest} title={title}>
        {children}
      </Notice>
    </div>
  );
}
