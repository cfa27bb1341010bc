module.exports = async () => {
  await globalThis.vatwrightTestCluster?.stop();
};
