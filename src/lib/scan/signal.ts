let sound: AudioContext | undefined;

const TONES = {
	good: { pitch: 1320, ms: 80 },
	bad: { pitch: 180, ms: 260 },
	done: { pitch: 880, ms: 180 }
};
const BUZZ = { good: [60], bad: [120, 60, 120], done: [60, 40, 60] };

function tone(pitch: number, ms: number): void {
	try {
		sound ??= new AudioContext();
		void sound.resume();
		const [voice, loud] = [sound.createOscillator(), sound.createGain()];
		voice.frequency.value = pitch;
		loud.gain.setValueAtTime(0.2, sound.currentTime);
		loud.gain.exponentialRampToValueAtTime(0.001, sound.currentTime + ms / 1000);
		voice.connect(loud).connect(sound.destination);
		voice.start();
		voice.stop(sound.currentTime + ms / 1000);
	} catch {
		// A device without sound still shows what it read.
	}
}

/** A beep and a buzz, for hands whose eyes are elsewhere: read, not read, put away. */
export function signal(what: keyof typeof TONES): void {
	const { pitch, ms } = TONES[what];
	tone(pitch, ms);
	navigator.vibrate?.(BUZZ[what]);
}
