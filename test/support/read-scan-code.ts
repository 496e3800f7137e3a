import {
  BarcodeFormat,
  BinaryBitmap,
  DecodeHintType,
  HybridBinarizer,
  MultiFormatReader,
  RGBLuminanceSource,
} from '@zxing/library'

/** What another library's reader finds in a picture of a Data Matrix; it throws where it finds none. */
export function readScanCode(grey: Uint8ClampedArray, width: number, height: number): string {
  const source = new RGBLuminanceSource(grey, width, height)
  const hints = new Map<DecodeHintType, unknown>([
    [DecodeHintType.POSSIBLE_FORMATS, [BarcodeFormat.DATA_MATRIX]],
    [DecodeHintType.TRY_HARDER, true],
  ])
  const reader = new MultiFormatReader()
  return reader.decode(new BinaryBitmap(new HybridBinarizer(source)), hints).getText()
}
