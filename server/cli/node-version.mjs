const NEEDED = { major: 20, minor: 19 };

export function requireNodeVersion() {
  const [major = 0, minor = 0] = process.versions.node.split('.').map(Number);
  const isEnough = major > NEEDED.major || (major === NEEDED.major && minor >= NEEDED.minor);
  if (!isEnough)
    throw new Error(
      `Node ${NEEDED.major}.${NEEDED.minor} or newer is needed; this is ${process.versions.node}`,
    );
}
