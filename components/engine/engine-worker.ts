/** The engine in a thread of its own, so that the page goes on answering. One task a worker; stopped by ending it. */
import { assess } from '@/lib/engine/assess';
import { refit } from '@/lib/engine/refit';
import { applyReading } from './apply-reading';
import type { EngineMessage, EngineTask } from './engine-task';

const tell = (message: EngineMessage) => self.postMessage(message);

self.onmessage = ({ data }: MessageEvent<EngineTask>) => {
  try {
    tell({ kind: 'done', answer: perform(data) });
  } catch (error) {
    tell({ kind: 'failed', detail: error instanceof Error ? error.message : String(error) });
  }
};

function perform(task: EngineTask) {
  if (task.kind === 'refit') {
    const onProgress = ({ progress }: { progress: number }) => tell({ kind: 'progress', share: progress });
    return refit(task.document, task.free, { onProgress });
  }
  const document = applyReading(task.document, task.reading);
  return { document, assessment: assess(document) };
}
