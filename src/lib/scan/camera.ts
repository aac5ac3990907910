/** What kept the camera shut, in words that say what to do. */
export function cameraSaid(fault: unknown): string {
	const name = fault instanceof Error ? fault.name : '';
	if (name === 'NotAllowedError' || name === 'SecurityError')
		return 'This page may not use the camera. Allow it in the settings of the browser, then turn the camera on again. Or type the code.';
	if (name === 'NotFoundError' || name === 'OverconstrainedError')
		return 'This device has no camera. Type the code.';
	if (name === 'NotReadableError' || name === 'AbortError')
		return 'Another program has the camera. Close that, then turn the camera on again. Or type the code.';
	if (name === 'Insecure')
		return 'The camera opens only where the address begins with https. Type the code, or scan with the camera program of the phone.';
	return 'The camera did not open. Type the code, or turn the camera on again.';
}

class Insecure extends Error {
	override name = 'Insecure';
}

/** The camera on the back of the phone, or whichever there is. */
export async function openCamera(): Promise<MediaStream> {
	if (!navigator.mediaDevices?.getUserMedia) throw new Insecure();
	return navigator.mediaDevices.getUserMedia({
		audio: false,
		video: {
			facingMode: { ideal: 'environment' },
			width: { ideal: 1280 },
			height: { ideal: 720 }
		}
	});
}

export const closeCamera = (stream: MediaStream): void =>
	stream.getTracks().forEach((track) => track.stop());

type WithTorch<T> = T & { torch?: boolean };

/** Whether this camera has a light. */
export function hasTorch(stream: MediaStream): boolean {
	const [track] = stream.getVideoTracks();
	const can: WithTorch<MediaTrackCapabilities> = track?.getCapabilities?.() ?? {};
	return can.torch === true;
}

export async function setTorch(stream: MediaStream, on: boolean): Promise<void> {
	const torch: WithTorch<MediaTrackConstraintSet> = { torch: on };
	await stream.getVideoTracks()[0]?.applyConstraints({ advanced: [torch] });
}
