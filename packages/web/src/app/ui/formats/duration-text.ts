/** `2 h 14 m`, as a clock is read. @param minutes whole minutes, negative with a true minus */
export function durationText(minutes: number): string {
  const size = Math.abs(minutes);
  const hours = Math.floor(size / 60);
  const rest = size % 60;
  const text = hours === 0 ? `${rest} m` : rest === 0 ? `${hours} h` : `${hours} h ${rest} m`;
  return minutes < 0 ? `\u2212${text}` : text;
}

/** `7.5 h`, for columns of figures. @param minutes whole minutes */
export function hoursText(minutes: number): string {
  const text = `${(Math.abs(minutes) / 60).toFixed(1)} h`;
  return minutes < 0 ? `\u2212${text}` : text;
}
