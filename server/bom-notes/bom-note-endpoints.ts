import {
  downloadBomNote,
  issueBomNote,
  listBomNotes,
  previewBomNote,
  previewBomNoteFile,
  readBomNote,
} from '../../shared/contract/bom-note.ts';
import { endpoint, type Endpoint } from '../http/endpoint.ts';
import type { Services } from '../services.ts';
import { BomNoteService } from './bom-note-service.ts';

const member = { project: 'member' } as const;
const exporter = { project: ['exporter'] } as const;

export function bomNoteEndpoints({ database }: Pick<Services, 'database'>): Endpoint[] {
  const notes = new BomNoteService(database);
  return [
    endpoint(previewBomNote, member, async (call) => ({
      body: await notes.preview(call, call.params.projectId, call.query),
    })),
    endpoint(previewBomNoteFile, member, async (call) => {
      const { format, projectId } = call.params;
      const { decimalMark, ...choice } = call.query;
      return { body: await notes.previewFile(call, projectId, choice, { format, decimalMark }) };
    }),
    endpoint(listBomNotes, member, async ({ actor, params }) => ({
      body: { notes: await notes.list(actor, params.projectId) },
    })),
    endpoint(issueBomNote, exporter, async (call) => ({
      body: await notes.issue(call, call.params.projectId, call.body.revisionIds),
    })),
    endpoint(readBomNote, member, async ({ actor, params }) => ({
      body: await notes.read(actor, params.noteId),
    })),
    endpoint(downloadBomNote, exporter, async (call) => {
      const wish = { format: call.params.format, decimalMark: call.query.decimalMark };
      return { body: await notes.file(call, call.params.noteId, wish) };
    }),
  ];
}
