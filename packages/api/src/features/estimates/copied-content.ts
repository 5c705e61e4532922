import type { RevisionContent } from '@bookmatch/common/estimates/revision-contract';

/** The same content for another revision: every room, line and stage gets an id of its own. */
export function copiedContent(content: RevisionContent, newId: () => string): RevisionContent {
  return {
    ...content,
    rooms: content.rooms.map((room) => ({
      ...room,
      id: newId(),
      lines: room.lines.map((line) => ({ ...line, id: newId() })),
    })),
    billingSchedule: content.billingSchedule.map((stage) => ({ ...stage, id: newId() })),
  };
}
