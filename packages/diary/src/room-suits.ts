/** What a visit asks of its room. */
export interface RoomNeeds {
  readonly kind: string;
  /** Codes of what must stand in it. */
  readonly equipment: readonly string[];
  readonly isStepFree: boolean;
}

export interface RoomFacts {
  readonly kind: string;
  readonly equipment: readonly string[];
  readonly isStepFree: boolean;
}

/** The codes that a room lacks. */
export const missingEquipment = (room: RoomFacts, equipment: readonly string[]): string[] =>
  equipment.filter((code) => !room.equipment.includes(code));

/** Whether a room is of the kind, has the equipment, and is reached without a step where that is needed. */
export function roomSuits(room: RoomFacts, needs: RoomNeeds): boolean {
  if (room.kind !== needs.kind || (needs.isStepFree && !room.isStepFree)) return false;
  return missingEquipment(room, needs.equipment).length === 0;
}
