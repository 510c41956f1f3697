/** Stands for NULL among the codes of an enumeration, a byte each: a list of 255 words has codes up to 254. */
export const NULL_CODE = 255;
