/** The edition inside the registry's page: waits for its task, and tells its height. */
import { useEffect, useRef, useState } from 'react';
import { Announcer } from '../ui/announcer.tsx';
import { Loading } from '../ui/loading.tsx';
import type { Task } from './messages.ts';
import { Preparing } from './preparing.tsx';
import type { Surroundings } from './surroundings.ts';
import type { Workroom } from './worker-client.ts';

export interface EmbeddedProps {
  readonly workroom: Workroom;
  readonly surroundings: Surroundings;
  readonly today: string;
}

export function Embedded({ workroom, surroundings, today }: EmbeddedProps) {
  const [task, setTask] = useState<Task | null>(null);
  const sheet = useRef<HTMLDivElement>(null);

  useEffect(() => {
    const end = surroundings.listen((message) => {
      if (message.kind === 'task') setTask(message);
    });
    surroundings.tell({ kind: 'ready' });
    return end;
  }, [surroundings]);

  useEffect(() => {
    const { dataset } = document.documentElement;
    if (task === null || task.theme === 'system') delete dataset.theme;
    else dataset.theme = task.theme;
  }, [task]);

  useEffect(() => {
    const { current } = sheet;
    if (current === null) return;
    const observer = new ResizeObserver(() =>
      surroundings.tell({ kind: 'height', pixels: Math.ceil(current.getBoundingClientRect().height) }),
    );
    observer.observe(current);
    return () => observer.disconnect();
  }, [surroundings]);

  return (
    <div ref={sheet} className="sheet bg-sheet">
      {task === null ? (
        <div className="px-4 md:px-8">
          <Loading>Getting ready.</Loading>
        </div>
      ) : (
        <Preparing key={task.site.code} workroom={workroom} task={task} surroundings={surroundings} today={today} />
      )}
      <Announcer />
    </div>
  );
}
