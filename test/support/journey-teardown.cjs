module.exports = async () => {
  const children = globalThis.vatwrightJourney ?? [];
  const ended = children.map((child) => new Promise((resolve) => child.once('exit', resolve)));
  for (const child of children) child.kill('SIGTERM');
  await Promise.all(ended);
  await globalThis.vatwrightTestCluster?.stop();
};
