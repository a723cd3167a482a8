/** A message as the start command's own mail server received it. */
export interface LocalMailHeadDto {
  readonly id: string;
  readonly to: string;
  readonly subject: string;
  readonly receivedAt: string;
}

export interface LocalMailDto extends LocalMailHeadDto {
  readonly from: string;
  readonly messageId: string;
  readonly text: string;
  readonly html: string;
}
