/** Sound and vibration at the end of a run: extras, never the only sign. */
export function signalEnd(): void {
  navigator.vibrate?.([250, 120, 250]);
  if (!('AudioContext' in globalThis)) return;
  const audio = new AudioContext();
  const volume = audio.createGain();
  volume.gain.value = 0.25;
  volume.connect(audio.destination);
  for (const [at, pitch] of [
    [0, 880],
    [0.3, 660]
  ] as const) {
    const tone = audio.createOscillator();
    tone.frequency.value = pitch;
    tone.connect(volume);
    tone.start(audio.currentTime + at);
    tone.stop(audio.currentTime + at + 0.2);
  }
  setTimeout(() => void audio.close(), 1000);
}
