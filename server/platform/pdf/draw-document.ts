import { PDFDocument } from 'pdf-lib'
import type { PdfDocumentModel } from '../../../shared/domain/documents/pdf-document-model.ts'
import { measureBlocks } from './blocks/measure-block.ts'
import { Canvas } from './canvas.ts'
import { embedFont } from './embedded-font.ts'
import { drawGraduatedBorder } from './graduated-border.ts'
import { pageFoot } from './page-foot.ts'
import { pageGeometry } from './page-geometry.ts'
import { cartouche, noticeStrip, runningHead } from './page-head.ts'
import { paginate } from './paginate.ts'
import { px } from './type-scale.ts'
import { typeface } from './typeface.ts'

const roomAbove = px(8)
const roomBelow = px(4)

/**
 * Measures a document, distributes it over pages and draws it. The same model always gives the same bytes.
 * It works for some tens of milliseconds without a pause: the server calls it through the worker pool.
 *
 * @throws PdfRenderError missing-glyph, does-not-fit, bad-model
 */
export async function drawDocument(model: PdfDocumentModel): Promise<Uint8Array> {
  const face = typeface()
  const geometry = pageGeometry(model.paper)
  const { inner } = geometry
  const notice = model.notice === undefined ? undefined : noticeStrip(model.notice, face, geometry)
  const heads = [cartouche(model, face, geometry), runningHead(model, face, geometry)] as const
  const foot = pageFoot(model, face, geometry)
  const headOn = (page: number) => (page === 0 ? heads[0] : heads[1])
  const taken = (page: number): number => headOn(page).height + (notice?.height ?? 0)
  const roomOn = (page: number): number => inner.height - taken(page) - foot.height - roomAbove - roomBelow
  const pieces = measureBlocks(model.blocks, { face, width: geometry.textWidth, pageRoom: roomOn(1), model })
  const pages = paginate(pieces, roomOn)

  const document = await PDFDocument.create()
  setProperties(document, model)
  const font = await embedFont(document, face)
  pages.forEach((placed, index) => {
    const canvas = new Canvas(document.addPage([geometry.width, geometry.height]), face, font)
    drawGraduatedBorder(canvas, geometry)
    headOn(index).draw(canvas, inner.left, inner.top)
    notice?.draw(canvas, inner.left, inner.top + headOn(index).height)
    const top = inner.top + taken(index) + roomAbove
    for (const { piece, top: down } of placed) piece.draw(canvas, geometry.textLeft, top + down)
    foot.on(index + 1, pages.length).draw(canvas, inner.left, inner.top + inner.height - foot.height)
  })
  return document.save()
}

function setProperties(document: PDFDocument, model: PdfDocumentModel): void {
  const printedAt = new Date(model.printed.atIso)
  document.setTitle(model.title, { showInWindowTitleBar: true })
  document.setLanguage(model.language)
  document.setAuthor(model.head.facility)
  document.setSubject(model.head.name)
  document.setCreator('Pratique')
  document.setProducer('Pratique')
  document.setCreationDate(printedAt)
  document.setModificationDate(printedAt)
}
