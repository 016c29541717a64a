import type { Sound } from '@/lib/round/types';

interface Note {
  hertz: number;
  at: number;
  seconds: number;
  wave: OscillatorType;
}

/** In: one high tick. Off: two falling. Refused: a low buzz. */
const NOTES: Record<Sound, Note[]> = {
  in: [{ hertz: 1320, at: 0, seconds: 0.06, wave: 'sine' }],
  off: [
    { hertz: 660, at: 0, seconds: 0.08, wave: 'triangle' },
    { hertz: 440, at: 0.09, seconds: 0.12, wave: 'triangle' },
  ],
  refused: [{ hertz: 140, at: 0, seconds: 0.28, wave: 'square' }],
};

const LOUDNESS = 0.18;

let context: AudioContext | undefined;

/** Plays one of the three sounds; where the browser has none, or has not been touched yet, nothing happens. */
export function playSound(sound: Sound): void {
  try {
    context ??= new AudioContext();
    if (context.state === 'suspended') void context.resume().catch(() => {});
    for (const note of NOTES[sound]) playNote(context, note);
  } catch {
    context = undefined;
  }
}

function playNote(audio: AudioContext, { hertz, at, seconds, wave }: Note): void {
  const start = audio.currentTime + at;
  const tone = audio.createOscillator();
  const gain = audio.createGain();
  tone.type = wave;
  tone.frequency.value = hertz;
  gain.gain.setValueAtTime(LOUDNESS, start);
  gain.gain.exponentialRampToValueAtTime(0.001, start + seconds);
  tone.connect(gain).connect(audio.destination);
  tone.start(start);
  tone.stop(start + seconds);
}
