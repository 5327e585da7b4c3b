/** The largest file that is taken, in MB of 1 048 576 bytes. */
export const fileLimitMB = 15
