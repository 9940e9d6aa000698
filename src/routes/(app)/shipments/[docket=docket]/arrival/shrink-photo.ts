const longestPx = 2048;
const quality = 0.85;

/**
 * The picture as a JPEG of at most 2,048 px, drawn anew: it is the right way up and keeps nothing of what the camera
 * wrote. Null where the browser cannot read the file as a picture.
 */
export async function shrinkPhoto(file: File): Promise<Blob | null> {
	const picture = await createImageBitmap(file, { imageOrientation: 'from-image' }).catch(() => null);
	if (!picture) return null;
	const scale = Math.min(1, longestPx / Math.max(picture.width, picture.height));
	const canvas = document.createElement('canvas');
	canvas.width = Math.max(1, Math.round(picture.width * scale));
	canvas.height = Math.max(1, Math.round(picture.height * scale));
	canvas.getContext('2d')?.drawImage(picture, 0, 0, canvas.width, canvas.height);
	picture.close();
	return new Promise((resolve) => canvas.toBlob(resolve, 'image/jpeg', quality));
}
