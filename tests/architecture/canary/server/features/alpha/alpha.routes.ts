import express from 'express'

export const used = express
