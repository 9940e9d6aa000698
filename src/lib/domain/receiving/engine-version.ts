/** Names the digits: any change to a stored figure, however small, takes a new version. */
export const engineVersion = '1.2.0';
