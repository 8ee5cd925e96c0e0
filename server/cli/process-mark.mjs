import fs from 'node:fs';
import path from 'node:path';

/**
 * When a process began, in clock ticks since boot: with its pid a name that no later process gets. Undefined when it
 * is gone; a zombie that nobody has collected yet counts as gone.
 *
 * @param {number} pid
 */
function findStartTicks(pid) {
  let stat;
  try {
    stat = fs.readFileSync(`/proc/${pid}/stat`, 'utf8');
  } catch {
    return undefined;
  }
  // The program's name, in parentheses, may hold spaces: count fields from behind it. State is 3rd, start time 22nd.
  const fields = stat.slice(stat.lastIndexOf(')') + 2).split(' ');
  return fields[0] === 'Z' || fields[0] === 'X' ? undefined : fields[19];
}

/** @param {number} pid */
export const isLiveProcess = (pid) => findStartTicks(pid) !== undefined;

/** @param {number} pid */
const markName = (pid) => `${pid}-${findStartTicks(pid)}`;

/** @param {string} mark */
function isLive(mark) {
  const [pid, ticks] = mark.split('-');
  return ticks !== undefined && findStartTicks(Number(pid)) === ticks;
}

/**
 * Says in a folder that this process uses what the folder stands for.
 *
 * @param {string} folder
 */
export function leaveMark(folder) {
  fs.mkdirSync(folder, { recursive: true });
  fs.writeFileSync(path.join(folder, markName(process.pid)), '');
}

/** @param {string} folder */
export function removeMark(folder) {
  fs.rmSync(path.join(folder, markName(process.pid)), { force: true });
}

/**
 * Whether any live process still has its mark here; marks of dead ones are swept.
 *
 * @param {string} folder
 */
export function hasLiveMark(folder) {
  if (!fs.existsSync(folder)) return false;
  const marks = fs.readdirSync(folder);
  for (const mark of marks) if (!isLive(mark)) fs.rmSync(path.join(folder, mark), { force: true });
  return marks.some(isLive);
}
