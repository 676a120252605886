/** A point on a dial at a minute, twelve at the top. */
const spot = (minute: number, centre: { x: number; y: number }, radius: number): string => {
  const angle = (minute / 60) * 2 * Math.PI;
  return `${(centre.x + radius * Math.sin(angle)).toFixed(1)} ${(centre.y - radius * Math.cos(angle)).toFixed(1)}`;
};

/** Where the hands of a clock end that shows `minutesOfDay`: the hour hand creeps on between the hours. */
export function handsAt(minutesOfDay: number, centre: { x: number; y: number }, radius: number): { hour: string; minute: string } {
  return { hour: spot((minutesOfDay / 12) % 60, centre, radius * 0.62), minute: spot(minutesOfDay % 60, centre, radius * 0.98) };
}

/**
 * The outline of the piece of a dial that is still to wait: from the minute hand on for `waitMinutes`. An hour or
 * more is the whole dial, nothing is no piece.
 */
export function dialPiece(minutesOfDay: number, waitMinutes: number, centre: { x: number; y: number }, radius: number): string | null {
  if (waitMinutes <= 0) return null;
  const whole = `A${radius} ${radius} 0 1 1`;
  if (waitMinutes >= 60) return `M${spot(0, centre, radius)}${whole} ${spot(30, centre, radius)}${whole} ${spot(0, centre, radius)}Z`;
  const arc = `A${radius} ${radius} 0 ${waitMinutes > 30 ? 1 : 0} 1`;
  return `M${centre.x} ${centre.y}L${spot(minutesOfDay, centre, radius)}${arc} ${spot(minutesOfDay + waitMinutes, centre, radius)}Z`;
}
