package bedmark.pack;

import bedmark.document.Branch;

/**
 * A receipt whose signature fits; whether the office is trusted is for the reader to decide.
 *
 * @param receipt     what is confirmed
 * @param fingerprint of the key that signed it
 * @param document    the file's whole content, with key and signature
 */
public record SignedReceipt(Receipt receipt, Fingerprint fingerprint, Branch document) {
}
