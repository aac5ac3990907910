import sharp, { type Sharp } from 'sharp';

/** A picture of a label in grey, upright, ready to be read; its size in pixels. */
export interface GreyPicture {
	bytes: Buffer;
	width: number;
	height: number;
}

export interface Cut {
	left: number;
	top: number;
	width: number;
	height: number;
}

const GREY = { r: 128, g: 128, b: 128 };

const measured = async (picture: Sharp): Promise<GreyPicture> => {
	const { data, info } = await picture.png({ compressionLevel: 1 }).toBuffer({
		resolveWithObject: true
	});
	return { bytes: data, width: info.width, height: info.height };
};

/** The picture turned clockwise by so many degrees, in grey, from black to white, no wider or higher than `most`. */
export async function greyPicture(bytes: Buffer, turn: number, most: number): Promise<GreyPicture> {
	const small = await sharp(bytes)
		.greyscale()
		.resize(most, most, { fit: 'inside', withoutEnlargement: true })
		.normalise()
		.toBuffer();
	return measured(sharp(small).rotate(turn, { background: GREY }).greyscale());
}

/** A part of a picture, larger or smaller; `even` takes shadows and glare out. */
export function cutOut(grey: GreyPicture, cut: Cut, scale: number, even: boolean) {
	const width = Math.round(cut.width * scale);
	const part = sharp(grey.bytes).extract(cut).resize({ width, kernel: 'cubic' });
	return measured(
		even ? part.clahe({ width: 80, height: 80, maxSlope: 3 }).median(3) : part.normalise()
	);
}
